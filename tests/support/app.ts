import type { Database } from '../../src/lib/server/db/client';
import type { TestDatabase } from './database';

export const origin = 'https://northlight.example';

/** Makes a test's database the one that handlers, hooks and Auth.js find, as they would in a running process. */
export function useApp(database: TestDatabase): void {
	Object.assign(process.env, {
		DATABASE_URL: database.url,
		SMTP_URL: 'smtp://127.0.0.1:2525',
		ORIGIN: origin,
		AUTH_SECRET: 'a secret that only these tests know, 32+',
		LOG_LEVEL: 'silent'
	});
	(globalThis as typeof globalThis & { calipressDatabase?: Database }).calipressDatabase = database;
}
