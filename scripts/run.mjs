// `npm run admin -- EMAIL`, `npm run token -- EMAIL SCOPE…`: commands on the database that DATABASE_URL names,
// or on the one of `npm start`, which is started for as long as it takes where it is not running.
import { join } from 'node:path';
import { createServer } from 'vite';
import { runningMariadb } from './parts/mariadb.mjs';
import { embeddedDatabase, openDataFolder, secretOf } from './parts/embedded.mjs';
import { giveUp, say } from './parts/words.mjs';

const [name, ...args] = process.argv.slice(2);
if (name !== 'admin' && name !== 'token') giveUp('There are two commands: admin and token.');
const folder = process.env.DATA_DIR || 'data';

async function databaseUrl() {
	if (process.env.DATABASE_URL) return { url: process.env.DATABASE_URL, stop: async () => undefined };
	const running = runningMariadb(join(folder, 'mariadb'));
	if (running) return { url: `${running.url}calipress`, stop: async () => undefined };
	await openDataFolder(folder, false);
	return embeddedDatabase(folder);
}

const { url, stop } = await databaseUrl();
process.env.DATABASE_URL = url;
process.env.AUTH_SECRET ||= secretOf(folder);
process.env.SMTP_URL ||= 'smtp://127.0.0.1:25';
process.env.LOG_LEVEL ||= 'warn';
// The commands are TypeScript with the application's own aliases: Vite loads them as it loads the application.
const vite = await createServer({
	server: { middlewareMode: true, hmr: false, ws: false },
	appType: 'custom',
	logLevel: 'error',
	optimizeDeps: { noDiscovery: true, include: [] }
});
let code;
try {
	const [{ run }, { openDatabase }, { migrateDatabase }] = await Promise.all([
		vite.ssrLoadModule(`/src/lib/server/cli/${name}.ts`),
		vite.ssrLoadModule('/src/lib/server/db/client.ts'),
		vite.ssrLoadModule('/src/lib/server/migrate.ts')
	]);
	await migrateDatabase(url);
	const { db, pool } = openDatabase(url);
	const port = process.env.PORT || 3000;
	code = await run(args, {
		db,
		now: new Date(),
		origin: (process.env.ORIGIN || `http://localhost:${port}`).replace(/\/$/, ''),
		print: say
	});
	await pool.end();
} finally {
	await vite.close();
	await stop();
}
process.exit(code);
