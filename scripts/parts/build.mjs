import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { giveUp, say } from './words.mjs';

const sources = [
	'src',
	'static',
	'content-templates',
	'package-lock.json',
	'svelte.config.js',
	'vite.config.ts',
	'tailwind.config.ts',
	'tsconfig.json'
];
const stamp = 'build/.calipress-sources';

/** @param {string} path @returns {string[]} */
const filesOf = (path) =>
	!existsSync(path)
		? []
		: statSync(path).isDirectory()
			? readdirSync(path)
					.sort()
					.flatMap((name) => filesOf(join(path, name)))
			: [path];

function fingerprint() {
	const hash = createHash('sha256');
	for (const file of sources.flatMap(filesOf)) {
		// A test changes nothing that is served.
		if (/\.test\.ts$|^static\/docs\//.test(file)) continue;
		hash.update(file).update('\0').update(readFileSync(file)).update('\0');
	}
	return hash.digest('hex');
}

/** Builds the application when its sources are not those of the build that is there. */
export function ensureBuild() {
	const now = fingerprint();
	if (existsSync(stamp) && existsSync('build/handler.js') && readFileSync(stamp, 'utf8') === now) return;
	say('Building the application …');
	const { status, stdout, stderr } = spawnSync(
		process.execPath,
		['node_modules/.bin/vite', 'build', '--logLevel', 'warn'],
		{ encoding: 'utf8', maxBuffer: 1 << 26 }
	);
	if (status !== 0) giveUp(`${stdout}\n${stderr}\nThe application could not be built: see the lines above.`);
	writeFileSync(stamp, now);
}
