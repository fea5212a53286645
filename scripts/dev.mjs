// `npm run dev`: Vite with its own database and mail fake in the data folder, and the demo.
import { spawn } from 'node:child_process';
import { embeddedDatabase, embeddedMail, openDataFolder, remember, secretOf } from './parts/embedded.mjs';
import { say } from './parts/words.mjs';

const folder = process.env.DATA_DIR || 'data';
const port = process.env.PORT || '5173';
await openDataFolder(folder, process.argv.includes('--fresh'));
const database = process.env.DATABASE_URL ? undefined : await embeddedDatabase(folder);
const mail = process.env.SMTP_URL ? undefined : await embeddedMail(folder);
remember(folder, { databasePort: database?.port, smtpPort: mail?.smtpPort, webPort: mail?.webPort });
if (mail) say(`Mail it sends: ${mail.webUrl}`);
const vite = spawn(process.execPath, ['node_modules/.bin/vite', 'dev', '--port', port, '--strictPort'], {
	stdio: 'inherit',
	env: {
		...process.env,
		NODE_ENV: 'development',
		ORIGIN: process.env.ORIGIN || `http://localhost:${port}`,
		DATA_DIR: folder,
		DATABASE_URL: process.env.DATABASE_URL ?? database?.url,
		SMTP_URL: process.env.SMTP_URL ?? mail?.smtpUrl,
		AUTH_SECRET: process.env.AUTH_SECRET || secretOf(folder),
		DEMO: database ? 'on' : 'off'
	}
});
vite.once('exit', async (code) => {
	await mail?.stop();
	await database?.stop();
	process.exit(code ?? 0);
});
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM']))
	process.on(signal, () => vite.kill('SIGTERM'));
