import { drizzle } from 'drizzle-orm/mysql2';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import { createConnection, type RowDataPacket } from 'mysql2/promise';

const lockName = 'calipress.migrate';
const lockWaitS = 120;

/**
 * Brings a database to the schema in `folder`, under a lock of the server, so that processes that start together
 * take turns and the later ones find nothing left to do.
 */
export async function migrateDatabase(url: string, folder = 'drizzle'): Promise<void> {
	const connection = await createConnection({ uri: url.replace(/^mariadb:/, 'mysql:'), timezone: 'Z' });
	try {
		const [rows] = await connection.query<RowDataPacket[]>('select get_lock(?, ?) as got', [
			lockName,
			lockWaitS
		]);
		if (rows[0]?.got !== 1)
			throw new Error(`Another process has been migrating this database for ${lockWaitS} s.`);
		await migrate(drizzle(connection), { migrationsFolder: folder });
		await connection.query('select release_lock(?)', [lockName]);
	} finally {
		await connection.end();
	}
}
