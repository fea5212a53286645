// Layout, rules, layers and leftovers, each by its own tool. All run, so that one look shows everything.
import { spawnSync } from 'node:child_process';
import { say } from './parts/words.mjs';

/** @type {[string, string[]][]} */
const tools = [
	['prettier', ['--check', '--log-level', 'warn', '.']],
	['eslint', ['--cache', '--cache-location', 'node_modules/.cache/eslint/', '--max-warnings', '0', '.']],
	['depcruise', ['--config', '.dependency-cruiser.cjs', '--output-type', 'err', 'src']],
	['knip', ['--no-progress']]
];

spawnSync(process.execPath, ['node_modules/.bin/svelte-kit', 'sync'], { stdio: 'ignore' });
let failed = 0;
for (const [tool, args] of tools) {
	const { status } = spawnSync(process.execPath, [`node_modules/.bin/${tool}`, ...args], {
		stdio: 'inherit'
	});
	if (status !== 0) failed += 1;
	say(`${tool}: ${status === 0 ? 'clean' : 'found something'}`);
}
process.exit(failed === 0 ? 0 : 1);
