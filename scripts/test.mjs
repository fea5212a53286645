// `npm test`: sets up what it needs, then every check, and a last line that counts them.
import { spawnSync } from 'node:child_process';
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
/** @param {string} name @param {string[]} args @param {Record<string, string>} [env] */
function run(name, args, env = {}) {
	say(`\n── ${name}`);
	const began = Date.now();
	const { status } = spawnSync(process.execPath, args, {
		stdio: ['ignore', 'inherit', 'inherit'],
		env: { ...process.env, ...env }
	});
	say(`── ${name}: ${status === 0 ? 'passed' : 'FAILED'} in ${Math.round((Date.now() - began) / 1000)} s`);
	return status === 0;
}
/** A step that counts as one. @param {string} name @param {string[]} args */
const one = (name, args) => (run(name, args) ? passed++ : failed++);
/**
 * A step whose own report is counted; one that dies without a report counts as a failure.
 * @param {string} name @param {string[]} args @param {string} report @param {(json: any) => [number, number]} count
 */
function many(name, args, report, count) {
	const fine = run(name, args, { LOG_LEVEL: 'silent' });
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

one('lint', ['scripts/lint.mjs']);
one('types', ['scripts/check.mjs']);
many('unit', vitest('unit'), 'test-results/unit.json', vitestCount);
many('integration', vitest('integration'), 'test-results/integration.json', vitestCount);
many('browser', ['scripts/e2e.mjs'], 'test-results/e2e.json', ({ stats }) => [
	stats.expected,
	stats.unexpected + stats.flaky
]);

say(`\n${passed} passed, ${failed} failed`);
process.exit(failed === 0 && passed > 0 ? 0 : 1);
