// What must be on the machine before anything of ours can be imported: only Node's own modules here.
import { execFileSync, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { giveUp, say } from './words.mjs';

const stamp = 'node_modules/.calipress-lock';
const extraPaths = ['/usr/sbin', '/usr/local/sbin', '/sbin'];

export function checkNode() {
	const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
	if (!((major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22))
		giveUp(`Calipress needs Node.js 20.19, or 22.12 and newer; this is ${process.versions.node}.`);
}

/** Where a program is, looked for in the places of servers too. @param {string} name @returns {string | undefined} */
export const program = (name) =>
	[...(process.env.PATH ?? '').split(delimiter), ...extraPaths]
		.map((folder) => join(folder, name))
		.find((file) => existsSync(file));

/** Installs the modules the lock file names, when they are not there or not those. */
export function ensureModules() {
	const lock = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
	if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
	say('Installing the packages of package-lock.json …');
	const { status } = spawnSync('npm', ['ci', '--no-audit', '--no-fund'], {
		stdio: ['ignore', 'inherit', 'inherit']
	});
	if (status !== 0)
		giveUp('The packages could not be installed: see the lines above. Nothing else was changed.');
	writeFileSync(stamp, lock);
}

/**
 * Makes sure programs of Debian packages are there: installs them as root, says what is missing otherwise.
 * @param {Record<string, string>} wanted program → Debian package
 */
export function ensureDebian(wanted) {
	const missing = [
		...new Set(
			Object.entries(wanted)
				.filter(([name]) => !program(name))
				.map(([, from]) => from)
		)
	];
	if (missing.length === 0) return;
	const list = missing.join(' ');
	if (process.getuid?.() !== 0 || !program('apt-get'))
		giveUp(
			`Missing on this machine: ${list}. Install it first, for example with: sudo apt-get install ${list}`
		);
	say(`Installing ${list} from Debian’s packages …`);
	const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
	try {
		execFileSync('apt-get', ['update', '-qq'], { env, stdio: ['ignore', 'ignore', 'inherit'] });
		execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...missing], {
			env,
			stdio: ['ignore', 'ignore', 'inherit']
		});
	} catch {
		giveUp(`Debian’s package manager could not install ${list}: see the lines above.`);
	}
}

export const databasePrograms = { mariadbd: 'mariadb-server', 'mariadb-install-db': 'mariadb-server' };
export const browserPrograms = { chromium: 'chromium' };
