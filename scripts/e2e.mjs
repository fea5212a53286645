// Browser tests against the built application: each worker has a house of its own, an application on a fresh
// data folder with the demo in it, so that two can work at once and no test meets another's data.
import { spawn } from 'node:child_process';
import { rmSync } from 'node:fs';
import { ensureBuild } from './parts/build.mjs';
import { embeddedDatabase, embeddedMail, secretOf } from './parts/embedded.mjs';
import { freePort } from './parts/mariadb.mjs';
import { scratchFolder } from './parts/scratch.mjs';
import { giveUp } from './parts/words.mjs';

ensureBuild();
const args = process.argv.slice(2);
// One file is quicker without a second house.
const houses = args.some((arg) => arg.endsWith('.spec.ts')) ? 1 : 2;

async function openHouse() {
	const folder = scratchFolder('e2e');
	const [database, mail, port] = await Promise.all([
		embeddedDatabase(folder),
		embeddedMail(folder),
		freePort()
	]);
	const origin = `http://localhost:${port}`;
	const env = {
		NODE_ENV: 'production',
		PORT: String(port),
		ORIGIN: origin,
		DATA_DIR: folder,
		DATABASE_URL: database.url,
		SMTP_URL: mail.smtpUrl,
		AUTH_SECRET: secretOf(folder),
		LOG_LEVEL: process.env.LOG_LEVEL || 'error',
		DEMO: 'on'
	};
	const app = spawn(process.execPath, ['scripts/serve.mjs'], {
		stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
		env: { ...process.env, ...env }
	});
	const ended = new Promise((done) => app.once('exit', done));
	const listening = new Promise((done) => app.once('message', () => done(true)));
	if (!(await Promise.race([listening, ended.then(() => false)])))
		giveUp('The application ended before it listened.');
	return {
		env: { ...env, BASE_URL: origin, MAILDEV_URL: mail.webUrl },
		async close() {
			app.kill('SIGTERM');
			await ended;
			await Promise.all([mail.stop(), database.stop()]);
			rmSync(folder, { recursive: true, force: true });
		}
	};
}

const open = [];
// One after the other: the mail fake's ports are found, not asked for.
for (let n = 0; n < houses; n += 1) open.push(await openHouse());
const tests = spawn(process.execPath, ['node_modules/.bin/playwright', 'test', ...args], {
	stdio: 'inherit',
	// playwright.config.ts gives each worker the environment of its house.
	env: { ...process.env, E2E_HOUSES: JSON.stringify(open.map((house) => house.env)) }
});
const code = await new Promise((done) => tests.once('exit', done));
await Promise.all(open.map((house) => house.close()));
process.exit(typeof code === 'number' ? code : 1);
