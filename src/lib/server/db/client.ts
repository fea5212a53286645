import type { ExtractTablesWithRelations } from 'drizzle-orm';
import type { MySqlTransaction, MySqlTransactionConfig } from 'drizzle-orm/mysql-core';
import {
	drizzle,
	type MySql2Database,
	type MySql2PreparedQueryHKT,
	type MySql2QueryResultHKT
} from 'drizzle-orm/mysql2';
import { createPool, type Pool } from 'mysql2/promise';
import * as schema from './schema';

export type Schema = typeof schema;
export type Connection = MySql2Database<Schema>;
export type Transaction = MySqlTransaction<
	MySql2QueryResultHKT,
	MySql2PreparedQueryHKT,
	Schema,
	ExtractTablesWithRelations<Schema>
>;
/** A query takes either: it works inside and outside a transaction. */
export type Db = Connection | Transaction;

export interface Database {
	pool: Pool;
	db: Connection;
}

/** Opens a pool. Times go over the wire in UTC. */
export function openDatabase(url: string, connectionLimit = 10): Database {
	const pool = createPool({
		uri: url.replace(/^mariadb:/, 'mysql:'),
		timezone: 'Z',
		supportBigNumbers: true,
		connectionLimit,
		charset: 'utf8mb4_unicode_ci'
	});
	return { pool, db: drizzle(pool, { schema, mode: 'default' }) };
}

const passing = new Set([1020, 1205, 1213]);
const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** The server's error number behind an error, through Drizzle's wrapper; undefined when it is none of the server's. */
export function errno(error: unknown): number | undefined {
	for (let e: unknown = error, depth = 0; e instanceof Error && depth < 5; e = e.cause, depth++) {
		if ('errno' in e && typeof e.errno === 'number') return e.errno;
	}
	return undefined;
}

export const isDuplicate = (error: unknown) => errno(error) === 1062;

/**
 * Runs work in one transaction, again when the server asks for it (deadlock, lock wait, changed row), at most five times.
 * Inside a transaction already, it runs in a savepoint and leaves the retry to the outermost.
 */
export async function inTransaction<T>(
	db: Db,
	work: (tx: Transaction) => Promise<T>,
	config?: MySqlTransactionConfig
): Promise<T> {
	for (let attempt = 1; ; attempt++) {
		try {
			return await db.transaction(work, config);
		} catch (error) {
			const number = errno(error);
			if ('rollback' in db || attempt >= 5 || number === undefined || !passing.has(number)) throw error;
			await pause(2 ** attempt * 5 * (0.5 + Math.random()));
		}
	}
}
