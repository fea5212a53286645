import { execFileSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createConnection as connect, createServer } from 'node:net';
import { tmpdir, userInfo } from 'node:os';
import { join, resolve } from 'node:path';
import { commandOf, startService } from './child.mjs';
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

/** Where our server answers: other people on the machine reach the port too, so it has a password. @param {string} home @param {number} port */
const urlOf = (home, port) =>
	`mysql://root:${readFileSync(join(home, 'password'), 'utf8')}@127.0.0.1:${port}/`;

/** The statements the server runs before it listens; they set the password made at the first start. @param {string} home */
function initFile(home) {
	const password = join(home, 'password');
	if (!existsSync(password)) writeFileSync(password, randomBytes(24).toString('hex'), { mode: 0o600 });
	const file = join(home, 'init.sql');
	const statements = ['127.0.0.1', 'localhost'].map(
		(host) => `alter user if exists 'root'@'${host}' identified by '${readFileSync(password, 'utf8')}';\n`
	);
	writeFileSync(file, statements.join(''), { mode: 0o600 });
	return file;
}

/**
 * The MariaDB that runs over this data folder, whoever started it; null when none does.
 * @param {string} folder @returns {{ pid: number, url: string } | null}
 */
export function runningMariadb(folder) {
	const home = resolve(folder);
	try {
		const pid = Number(readFileSync(join(home, 'pid'), 'utf8'));
		const command = commandOf(pid) ?? [];
		const port = command.find((word) => word.startsWith('--port='))?.slice('--port='.length);
		return command.includes(`--datadir=${join(home, 'data')}`)
			? { pid, url: urlOf(home, Number(port)) }
			: null;
	} catch {
		return null;
	}
}

/** Ends our MariaDB over this folder whose starter was killed; refuses when the starter lives. @param {string} home */
export async function takeOver(home) {
	const running = runningMariadb(home);
	if (!running) return;
	const owner = Number(readFileSync(join(home, 'owner'), 'utf8'));
	if (commandOf(owner)?.some((word) => /\bnode$/.test(word)))
		throw new Error(
			`process ${owner} is using the database in ${home} already. End it first, or name another DATA_DIR.`
		);
	process.kill(running.pid, 'SIGTERM');
	for (let attempt = 0; commandOf(running.pid)?.[0]; attempt++) {
		if (attempt > 300) throw new Error(`the database left running as process ${running.pid} does not end.`);
		await pause(100);
	}
}

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
	await takeOver(home);
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
	writeFileSync(join(home, 'owner'), String(process.pid));
	const child = startService(need('mariadbd'), [
		'--no-defaults',
		`--user=${user}`,
		`--datadir=${data}`,
		'--bind-address=127.0.0.1',
		`--port=${port}`,
		`--socket=${join(sockets, 's')}`,
		`--pid-file=${pidFile}`,
		`--log-error=${join(home, 'log')}`,
		`--init-file=${initFile(home)}`,
		'--skip-name-resolve',
		'--character-set-server=utf8mb4',
		'--collation-server=utf8mb4_unicode_ci',
		'--default-time-zone=+00:00',
		'--max-allowed-packet=64M',
		...(throwaway ? ['--innodb-flush-log-at-trx-commit=0'] : [])
	]);
	const exited = new Promise((done) => child.once('exit', done));
	// Its own pid beside the port: on a port that another server took meanwhile, that one is not ours.
	for (let attempt = 0; runningMariadb(home)?.pid !== child.pid || !(await listens(port)); attempt++) {
		if (child.exitCode !== null || attempt > 300)
			throw new Error(`MariaDB did not start; its own words are in ${join(folder, 'log')}.`);
		await pause(100);
	}
	const stop = async () => {
		child.kill('SIGTERM');
		await exited;
		rmSync(sockets, { recursive: true, force: true });
	};
	return { url: urlOf(home, port), port, stop };
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
