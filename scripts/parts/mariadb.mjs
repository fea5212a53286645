import { execFileSync, spawn } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createConnection as connect, createServer } from 'node:net';
import { tmpdir, userInfo } from 'node:os';
import { join, resolve } from 'node:path';
import { program } from './packages.mjs';

/** A free port on loopback. @returns {Promise<number>} */
export const freePort = () =>
	new Promise((done, fail) => {
		const server = createServer();
		server.once('error', fail);
		server.listen(0, '127.0.0.1', () => {
			const address = server.address();
			server.close(() =>
				address && typeof address === 'object' ? done(address.port) : fail(new Error('No port was given.'))
			);
		});
	});

/** @param {number} ms */
export const pause = (ms) => new Promise((done) => setTimeout(done, ms));

/** Whether something listens on a loopback port. @param {number} port @returns {Promise<boolean>} */
export const listens = (port) =>
	new Promise((done) => {
		const socket = connect(port, '127.0.0.1');
		socket.once('connect', () => {
			socket.destroy();
			done(true);
		});
		socket.once('error', () => done(false));
	});

/** @param {string} name */
function need(name) {
	const found = program(name);
	if (!found) throw new Error(`${name} is not on this machine (Debian package mariadb-server).`);
	return found;
}

/** @param {number} pid */
const alive = (pid) => {
	try {
		process.kill(pid, 0);
		return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('mariadbd');
	} catch {
		return false;
	}
};

/**
 * Starts a MariaDB of our own over a data folder, on loopback; no other server is touched.
 * @param {{ folder: string, throwaway?: boolean }} options where data, log and pid are kept; a throwaway one need not survive the machine
 * @returns {Promise<{ url: string, port: number, stop: () => Promise<void> }>}
 */
export async function startMariadb({ folder, throwaway = false }) {
	const home = resolve(folder);
	const data = join(home, 'data');
	const pidFile = join(home, 'pid');
	const user = userInfo().username;
	mkdirSync(home, { recursive: true, mode: 0o700 });
	if (existsSync(pidFile) && alive(Number(readFileSync(pidFile, 'utf8'))))
		throw new Error(`Another process is using the database in ${folder}. Stop it first.`);
	if (!existsSync(join(data, 'mysql'))) {
		execFileSync(
			need('mariadb-install-db'),
			[
				'--no-defaults',
				`--user=${user}`,
				`--datadir=${data}`,
				'--auth-root-authentication-method=normal',
				'--skip-test-db'
			],
			{ stdio: ['ignore', 'ignore', 'pipe'] }
		);
	}
	// A socket path has at most 108 bytes, so it stands in a short folder of its own.
	const sockets = mkdtempSync(join(tmpdir(), 'cal-'));
	const port = await freePort();
	const child = spawn(
		need('mariadbd'),
		[
			'--no-defaults',
			`--user=${user}`,
			`--datadir=${data}`,
			'--bind-address=127.0.0.1',
			`--port=${port}`,
			`--socket=${join(sockets, 's')}`,
			`--pid-file=${pidFile}`,
			`--log-error=${join(home, 'log')}`,
			'--skip-name-resolve',
			'--character-set-server=utf8mb4',
			'--collation-server=utf8mb4_unicode_ci',
			'--default-time-zone=+00:00',
			'--max-allowed-packet=64M',
			...(throwaway ? ['--innodb-flush-log-at-trx-commit=0'] : [])
		],
		// In a group of its own: a Ctrl-C meant for us must not end it before the application has finished.
		{ stdio: 'ignore', detached: true }
	);
	const exited = new Promise((done) => child.once('exit', done));
	for (let attempt = 0; !(await listens(port)); attempt++) {
		if (child.exitCode !== null || attempt > 300)
			throw new Error(`MariaDB did not start; its words are in ${join(folder, 'log')}.`);
		await pause(100);
	}
	const stop = async () => {
		child.kill('SIGTERM');
		await exited;
		rmSync(sockets, { recursive: true, force: true });
	};
	return { url: `mysql://root@127.0.0.1:${port}/`, port, stop };
}

/** Creates a database where there is none. @param {string} url the server's address @param {string} name */
export async function createDatabase(url, name) {
	const { createConnection } = await import('mysql2/promise');
	const connection = await createConnection(url);
	await connection.query(
		`create database if not exists \`${name}\` character set utf8mb4 collate utf8mb4_unicode_ci`
	);
	await connection.end();
	return `${url}${name}`;
}
