// The services that `npm start` brings along when none are named: a database, a secret and a mail fake in the data folder.
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { createDatabase, startMariadb, takeOver } from './mariadb.mjs';
import { startMaildev } from './maildev.mjs';
import { giveUp } from './words.mjs';

const marker = '.calipress-data';

/** Makes the data folder, or takes the one that is ours and not in use. @param {string} folder @param {boolean} fresh empties it first */
export async function openDataFolder(folder, fresh) {
	const ours = existsSync(join(folder, marker));
	if (existsSync(folder) && readdirSync(folder).length > 0 && !ours)
		giveUp(
			`DATA_DIR ${folder} holds other things than Calipress’s data. Name an empty folder; nothing was touched.`
		);
	await takeOver(join(folder, 'mariadb')).catch((error) =>
		giveUp(`Calipress cannot start: ${error.message}`)
	);
	if (fresh) rmSync(folder, { recursive: true, force: true });
	mkdirSync(folder, { recursive: true, mode: 0o700 });
	writeFileSync(
		join(folder, marker),
		'The data of Calipress: database, uploads, mails of the local mail fake.\n'
	);
}

/** The secret that signs links, made once. @param {string} folder */
export function secretOf(folder) {
	mkdirSync(folder, { recursive: true, mode: 0o700 });
	const file = join(folder, 'secret');
	if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
	return readFileSync(file, 'utf8').trim();
}

/** @param {string} folder @returns {{ databasePort?: number, smtpPort?: number, webPort?: number }} */
export function remembered(folder) {
	const file = join(folder, 'run.json');
	try {
		return JSON.parse(readFileSync(file, 'utf8'));
	} catch {
		return {};
	}
}

/** @param {string} folder @param {Record<string, unknown>} value */
export const remember = (folder, value) =>
	writeFileSync(join(folder, 'run.json'), JSON.stringify(value, null, '\t'));

/** @param {string} folder */
export async function embeddedDatabase(folder) {
	const server = await startMariadb({ folder: join(folder, 'mariadb') });
	return { ...server, url: await createDatabase(server.url, 'calipress') };
}

/** @param {string} folder */
export const embeddedMail = (folder) => {
	const { smtpPort = 1025, webPort = 1080 } = remembered(folder);
	return startMaildev({ folder: join(folder, 'mail'), smtpPort, webPort });
};
