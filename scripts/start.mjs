// `npm start`: everything from a bare checkout to a running lab.
//   --fresh   start from an empty data folder      --empty   without the demo
import { spawn } from 'node:child_process';
import { listens } from './parts/mariadb.mjs';
import { checkNode, databasePrograms, ensureDebian, ensureModules } from './parts/packages.mjs';
import { giveUp, say } from './parts/words.mjs';

const flags = new Set(process.argv.slice(2));
for (const flag of flags)
	if (!['--fresh', '--empty'].includes(flag))
		giveUp(`npm start does not know ${flag}: it takes --fresh and --empty.`);
process.chdir(new URL('..', import.meta.url).pathname);

checkNode();
const { DATABASE_URL, SMTP_URL } = process.env;
const folder = process.env.DATA_DIR || 'data';
const host = process.env.HOST || '127.0.0.1';
const port = Number(process.env.PORT || 3000);
if (!Number.isInteger(port) || port < 1 || port > 65535)
	giveUp(`Calipress cannot start: PORT ${process.env.PORT} is not a port number`);
if (flags.has('--fresh') && DATABASE_URL)
	giveUp('--fresh empties our own database only; DATABASE_URL names another, which is left alone.');
ensureModules();
if (!DATABASE_URL) ensureDebian(databasePrograms);
const { ensureBuild } = await import('./parts/build.mjs');
ensureBuild();
if (await listens(port)) giveUp(`Calipress cannot start: PORT ${port} is in use.`);

const { embeddedDatabase, embeddedMail, openDataFolder, remember, secretOf } =
	await import('./parts/embedded.mjs');
await openDataFolder(folder, flags.has('--fresh'));

/** What was started, in its order. @type {(() => Promise<void>)[]} */
const stops = [];
const stopAll = async () => {
	for (let stop = stops.pop(); stop; stop = stops.pop()) await stop();
};
/** @type {import('node:child_process').ChildProcess | undefined} */
let app;
let ending = false;
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
	process.on(signal, () => {
		ending = true;
		// Asked to end before the application ran: what is starting ends as soon as it stands.
		if (app) app.kill('SIGTERM');
	});
const endIfAsked = async () => {
	if (!ending) return;
	await stopAll();
	process.exit(0);
};
/** @type {<T extends { stop: () => Promise<void> }>(starting: Promise<T>) => Promise<T>} */
const started = async (starting) => {
	try {
		const service = await starting;
		stops.push(service.stop);
		await endIfAsked();
		return service;
	} catch (error) {
		await stopAll();
		return giveUp(`Calipress cannot start: ${error instanceof Error ? error.message : error}`);
	}
};

const database = DATABASE_URL ? undefined : await started(embeddedDatabase(folder));
const mail = SMTP_URL ? undefined : await started(embeddedMail(folder));
const origin = process.env.ORIGIN || `http://localhost:${port}`;
const demo = Boolean(database) && !flags.has('--empty');
remember(folder, { databasePort: database?.port, smtpPort: mail?.smtpPort, webPort: mail?.webPort });

app = spawn(process.execPath, ['scripts/serve.mjs'], {
	stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
	detached: true,
	env: {
		...process.env,
		NODE_ENV: process.env.NODE_ENV || 'production',
		HOST: host,
		PORT: String(port),
		ORIGIN: origin,
		DATA_DIR: folder,
		DATABASE_URL: DATABASE_URL ?? database?.url,
		SMTP_URL: SMTP_URL ?? mail?.smtpUrl,
		AUTH_SECRET: process.env.AUTH_SECRET || secretOf(folder),
		LOG_LEVEL: process.env.LOG_LEVEL || 'warn',
		DEMO: demo ? 'on' : 'off'
	}
});
app.once('message', () => {
	say(`\n  Calipress        ${origin}`);
	say(`  Sign in          ${origin}/sign-in`);
	if (mail) say(`  Mail it sends    ${mail.webUrl}`);
	if (demo) {
		say('\n  Demo sign-ins    tester@  writer@  editor@  liaison@  admin@northlight.example');
		say('  Password         measure-then-print');
	} else say('\n  First admin      npm run admin -- you@example.org');
	say(`\n  Data             ${folder} (kept; npm start -- --fresh begins anew)\n  Ctrl-C ends it.\n`);
});
app.once('exit', async (code, signal) => {
	await stopAll();
	process.exit(signal ? 0 : (code ?? 1));
});
