import { createConnection } from 'mysql2/promise';
import { fillLab } from './lab.mjs';
import { fillMeasured } from './measured.mjs';
import { fillPrinted } from './printed.mjs';

/** What issue after issue is measured against: campaigns, runs and readings of some years. */
export const fullSize = { campaigns: 200, runs: 20_000, readings: 100_000 };

/**
 * Adds a lab's years of work to a database that has the schema, beside what is there.
 * @param {string} url @param {{ campaigns: number, runs: number, readings: number }} size
 * @returns {Promise<{ tag: string, people: { id: string }[] }>} the word in all its names, and the people: tester, writer, editor, liaison, admin and so on in turn
 */
export async function fill(url, { campaigns, runs, readings }) {
	const connection = await createConnection({ uri: url.replace(/^mariadb:/, 'mysql:'), timezone: 'Z' });
	const now = new Date();
	const tag = `f${now.getTime().toString(36)}`;
	try {
		await connection.beginTransaction();
		const lab = await fillLab(connection, { size: campaigns, tag, now });
		const { campaign } = await fillMeasured(connection, lab, { campaigns, runs, readings, tag, now });
		await fillPrinted(connection, lab, { articles: campaigns, campaign, campaigns, tag, now });
		await connection.commit();
		return { tag, people: lab.people };
	} finally {
		await connection.end();
	}
}
