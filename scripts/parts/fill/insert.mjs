/** Rows of one statement: large enough that the way to the server costs little, small enough for its packet. */
const rowsAtOnce = 2000;

/**
 * Inserts many rows of one shape.
 * @param {import('mysql2/promise').Connection} connection @param {string} table @param {Record<string, unknown>[]} rows
 */
export async function insertRows(connection, table, rows) {
	const columns = Object.keys(rows[0] ?? {});
	const names = columns.map((name) => `\`${name}\``).join(', ');
	for (let from = 0; from < rows.length; from += rowsAtOnce) {
		const values = rows.slice(from, from + rowsAtOnce).map((row) => columns.map((name) => row[name]));
		await connection.query(`insert into \`${table}\` (${names}) values ?`, [values]);
	}
}

/** The first number that no row of a table has. @param {import('mysql2/promise').Connection} connection @param {string} table */
export async function nextId(connection, table) {
	const [rows] = await connection.query(`select coalesce(max(id), 0) + 1 as id from \`${table}\``);
	return Number(/** @type {{ id: number }[]} */ (rows)[0]?.id);
}

/** Numbers from 0 on. @param {number} n */
export const upTo = (n) => Array.from({ length: n }, (_, i) => i);

/** Repeatable scatter between −1 and 1 (mulberry32). @param {number} seed */
export function scatter(seed) {
	let state = seed;
	return () => {
		state = (state + 0x6d2b79f5) | 0;
		let t = Math.imul(state ^ (state >>> 15), 1 | state);
		t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
		return ((t ^ (t >>> 14)) >>> 0) / 2 ** 31 - 1;
	};
}
