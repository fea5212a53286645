// Built applications over databases of a bench of their own; nothing else talks to that server.
import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { createConnection } from 'mysql2/promise';
import { freePort } from '../mariadb.mjs';

/**
 * Starts the built application over a database, without jobs of its own unless asked for.
 * @param {{ database: string, smtp: string, folder: string, jobs?: 'on' | 'off', demo?: 'on' | 'off' }} options
 */
export async function startApp({ database, smtp, folder, jobs = 'off', demo = 'off' }) {
	const port = await freePort();
	const origin = `http://localhost:${port}`;
	const child = spawn(process.execPath, ['scripts/serve.mjs'], {
		stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
		env: {
			...process.env,
			NODE_ENV: 'production',
			PORT: String(port),
			ORIGIN: origin,
			DATA_DIR: folder,
			DATABASE_URL: database,
			SMTP_URL: smtp,
			AUTH_SECRET: randomBytes(32).toString('hex'),
			LOG_LEVEL: 'error',
			JOBS: jobs,
			DEMO: demo
		}
	});
	const exited = new Promise((done) => child.once('exit', done));
	await Promise.race([
		new Promise((done) => child.once('message', done)),
		exited.then((code) => {
			throw new Error(`The application ended with ${code} before it listened.`);
		})
	]);
	const stop = async () => {
		child.kill('SIGTERM');
		await exited;
	};
	return { origin, stop };
}

/** Signs somebody in without a browser. @param {string} database @param {string} userId @returns {Promise<string>} the cookie */
export async function signedIn(database, userId) {
	const token = randomBytes(24).toString('hex');
	const connection = await createConnection({ uri: database, timezone: 'Z' });
	await connection.query('insert into session (session_token, user_id, expires) values (?, ?, ?)', [
		token,
		userId,
		new Date(Date.now() + 86_400_000 * 30)
	]);
	await connection.end();
	return `authjs.session-token=${token}`;
}
