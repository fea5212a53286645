// Browser tests against the built application, on a fresh data folder with the demo in it.
import { spawn } from 'node:child_process';
import { rmSync } from 'node:fs';
import { ensureBuild } from './parts/build.mjs';
import { embeddedDatabase, embeddedMail, secretOf } from './parts/embedded.mjs';
import { freePort } from './parts/mariadb.mjs';
import { scratchFolder } from './parts/scratch.mjs';
import { giveUp } from './parts/words.mjs';

ensureBuild();
const folder = scratchFolder('e2e');
const [database, mail, port] = await Promise.all([
	embeddedDatabase(folder),
	embeddedMail(folder),
	freePort()
]);
const origin = `http://localhost:${port}`;
const env = {
	...process.env,
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
	env
});
const ended = new Promise((done) => app.once('exit', done));
const listening = new Promise((done) => app.once('message', () => done(true)));
if (!(await Promise.race([listening, ended.then(() => false)])))
	giveUp('The application ended before it listened.');

const tests = spawn(process.execPath, ['node_modules/.bin/playwright', 'test', ...process.argv.slice(2)], {
	stdio: 'inherit',
	env: { ...env, BASE_URL: origin, MAILDEV_URL: mail.webUrl }
});
const code = await new Promise((done) => tests.once('exit', done));
app.kill('SIGTERM');
await ended;
await Promise.all([mail.stop(), database.stop()]);
rmSync(folder, { recursive: true, force: true });
process.exit(typeof code === 'number' ? code : 1);
