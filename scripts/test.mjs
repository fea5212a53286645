// `npm test`: sets up what it needs, then every check, and a last line that counts them.
import { spawn, spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import {
	browserPrograms,
	checkNode,
	databasePrograms,
	ensureDebian,
	ensureModules
} from './parts/packages.mjs';
import { say } from './parts/words.mjs';

process.chdir(new URL('..', import.meta.url).pathname);
checkNode();
ensureModules();
ensureDebian({ ...databasePrograms, ...(process.env.CHROMIUM ? {} : browserPrograms) });
rmSync('test-results', { recursive: true, force: true });
mkdirSync('test-results', { recursive: true });

let passed = 0;
let failed = 0;
/**
 * Runs a step; its words are kept while it runs beside another, and said when it is done.
 * @param {string} name @param {string[]} args @param {Record<string, string>} [env] @returns {Promise<boolean>}
 */
async function run(name, args, env = {}) {
	const began = Date.now();
	/** @type {Buffer[]} */
	const words = [];
	const child = spawn(process.execPath, args, {
		stdio: ['ignore', 'pipe', 'pipe'],
		env: { ...process.env, ...env }
	});
	for (const stream of [child.stdout, child.stderr])
		stream.on('data', (/** @type {Buffer} */ chunk) => words.push(chunk));
	const status = await new Promise((done) => child.once('close', done));
	say(`\n── ${name}\n${Buffer.concat(words).toString().trimEnd()}`);
	say(`── ${name}: ${status === 0 ? 'passed' : 'FAILED'} in ${Math.round((Date.now() - began) / 1000)} s`);
	return status === 0;
}
/** A step that counts as one. @param {string} name @param {string[]} args */
const one = async (name, args) => ((await run(name, args)) ? passed++ : failed++);
/**
 * A step whose own report is counted; one that dies without a report counts as a failure.
 * @param {string} name @param {string[]} args @param {string} report @param {(json: any) => [number, number]} count
 */
async function many(name, args, report, count) {
	const fine = await run(name, args, { LOG_LEVEL: 'silent' });
	try {
		const [good, bad] = count(JSON.parse(readFileSync(report, 'utf8')));
		passed += good;
		failed += fine ? bad : Math.max(1, bad);
	} catch {
		failed += 1;
	}
}
/** @type {(json: any) => [number, number]} */
const vitestCount = ({ numPassedTests, numFailedTests, numFailedTestSuites }) => [
	numPassedTests,
	Math.max(numFailedTests, numFailedTestSuites > 0 ? 1 : 0)
];
/** @param {string} project */
const vitest = (project) => [
	'node_modules/.bin/vitest',
	'run',
	'--project',
	project,
	'--reporter=default',
	'--reporter=json',
	`--outputFile.json=test-results/${project}.json`
];

// Done once here, so that the two below do not write the same files.
spawnSync(process.execPath, ['node_modules/.bin/svelte-kit', 'sync'], { stdio: 'ignore' });
// The linter works on one core for minutes: the other takes what needs no browser meanwhile.
await Promise.all([
	one('lint', ['scripts/lint.mjs']),
	(async () => {
		await one('types', ['scripts/check.mjs']);
		await many('unit', vitest('unit'), 'test-results/unit.json', vitestCount);
		await many('integration', vitest('integration'), 'test-results/integration.json', vitestCount);
	})()
]);
await many('browser', ['scripts/e2e.mjs'], 'test-results/e2e.json', ({ stats }) => [
	stats.expected,
	stats.unexpected + stats.flaky
]);

say(`\n${passed} passed, ${failed} failed`);
process.exit(failed === 0 && passed > 0 ? 0 : 1);
