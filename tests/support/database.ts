import { randomUUID } from 'node:crypto';
import { createConnection, type RowDataPacket } from 'mysql2/promise';
import { inject } from 'vitest';
import { openDatabase, type Database } from '../../src/lib/server/db/client';
import { migrateDatabase } from '../../src/lib/server/migrate';

export interface TestDatabase extends Database {
	url: string;
	close: () => Promise<void>;
}

/** A freshly migrated, empty database. */
export async function testDatabase(): Promise<TestDatabase> {
	const server = inject('databaseServerUrl');
	const name = `t_${randomUUID().replaceAll('-', '')}`;
	const root = await createConnection(server);
	await root.query(`create database ${name} character set utf8mb4 collate utf8mb4_unicode_ci`);
	await root.end();
	const url = `${server}${name}`;
	await migrateDatabase(url);
	const database = openDatabase(url);
	const close = async () => {
		await database.pool.query(`drop database ${name}`);
		await database.pool.end();
	};
	return { ...database, url, close };
}

/** Empties every table but the list of migrations, for a file that keeps one database over its tests. */
export async function emptyTables({ pool }: Database): Promise<void> {
	const connection = await pool.getConnection();
	try {
		const [tables] = await connection.query<RowDataPacket[]>(
			"select table_name as name from information_schema.tables where table_schema = database() and table_type = 'BASE TABLE' and table_name not like '\\_\\_%'"
		);
		await connection.query('set foreign_key_checks = 0');
		for (const { name } of tables) await connection.query(`delete from \`${String(name)}\``);
		await connection.query('set foreign_key_checks = 1');
	} finally {
		connection.release();
	}
}
