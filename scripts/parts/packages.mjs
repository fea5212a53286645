// What must be on the machine before anything of ours can be imported: only Node's own modules here.
import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { giveUp, say } from './words.mjs';

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

/**
 * Whether what npm wrote down of node_modules is what the lock file names, whoever installed it. Packages for other
 * machines are optional and may be missing.
 */
function modulesStand() {
	const installed = 'node_modules/.package-lock.json';
	if (!existsSync(installed)) return false;
	const wanted = JSON.parse(readFileSync('package-lock.json', 'utf8')).packages;
	const there = JSON.parse(readFileSync(installed, 'utf8')).packages;
	return Object.entries(wanted).every(
		([path, { version, optional }]) =>
			path === '' || there[path]?.version === version || (optional && !there[path])
	);
}

/** Installs the modules the lock file names, when they are not there or not those. */
export function ensureModules() {
	if (modulesStand()) return;
	say('Installing the packages of package-lock.json …');
	// The build and the mail fake are development packages: they are needed with NODE_ENV=production too.
	const { status } = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
		stdio: ['ignore', 'inherit', 'inherit']
	});
	if (status !== 0)
		giveUp('The packages could not be installed: see the lines above. Nothing else was changed.');
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
