import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir, userInfo } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mysql2/promise';

/** A free port on loopback. */
export const freePort = () =>
	new Promise<number>((resolve, reject) => {
		const server = createServer();
		server.once('error', reject);
		server.listen(0, '127.0.0.1', () => {
			const address = server.address();
			server.close(() =>
				address && typeof address === 'object'
					? resolve(address.port)
					: reject(new Error('No port was given.'))
			);
		});
	});

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

async function answers(url: string, child: ChildProcess): Promise<void> {
	for (let attempt = 0; attempt < 200; attempt++) {
		if (child.exitCode !== null) throw new Error(`MariaDB ended with ${child.exitCode} before it answered.`);
		try {
			await (await createConnection(url)).end();
			return;
		} catch {
			await pause(100);
		}
	}
	throw new Error('MariaDB did not answer within 20 s.');
}

/** Starts a MariaDB of the tests' own in a temporary folder; no other server is touched. */
export async function startMariadb(): Promise<{ url: string; stop: () => Promise<void> }> {
	// A socket path has at most 108 bytes: the folder's name is short.
	const folder = mkdtempSync(join(tmpdir(), 'cal-'));
	const user = userInfo().username;
	const data = join(folder, 'data');
	execFileSync(
		'mariadb-install-db',
		[
			'--no-defaults',
			`--user=${user}`,
			`--datadir=${data}`,
			'--auth-root-authentication-method=normal',
			'--skip-test-db'
		],
		{ stdio: 'ignore' }
	);
	const port = await freePort();
	const child = spawn(
		'mariadbd',
		[
			'--no-defaults',
			`--user=${user}`,
			`--datadir=${data}`,
			'--bind-address=127.0.0.1',
			`--port=${port}`,
			`--socket=${join(folder, 's.sock')}`,
			`--pid-file=${join(folder, 'pid')}`,
			'--skip-name-resolve',
			'--character-set-server=utf8mb4',
			'--collation-server=utf8mb4_unicode_ci',
			'--default-time-zone=+00:00',
			// A test database lives for minutes: losing it with the machine costs nothing.
			'--innodb-flush-log-at-trx-commit=0'
		],
		{ stdio: 'ignore' }
	);
	const url = `mysql://root@127.0.0.1:${port}/`;
	await answers(url, child);
	const stop = async () => {
		const ended = new Promise((resolve) => child.once('exit', resolve));
		child.kill('SIGTERM');
		await ended;
		rmSync(folder, { recursive: true, force: true });
	};
	return { url, stop };
}
