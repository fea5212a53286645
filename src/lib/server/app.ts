import { building } from '$app/environment';
import { openDatabase, type Database } from './db/client';
import { env } from './env';

// In development the hooks run again on every change: the pool stays.
const kept = globalThis as typeof globalThis & { calipressDatabase?: Database };

/** The composition root: the one database of this process. */
export function database(): Database {
	if (building) throw new Error('There is no database while building.');
	return (kept.calipressDatabase ??= openDatabase(env().DATABASE_URL));
}
