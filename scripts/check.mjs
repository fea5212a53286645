// Types of everything, Svelte's templates included.
import { spawnSync } from 'node:child_process';

for (const args of [
	['node_modules/.bin/svelte-kit', 'sync'],
	[
		'node_modules/.bin/svelte-check',
		'--tsconfig',
		'./tsconfig.json',
		'--fail-on-warnings',
		'--output',
		'human'
	]
]) {
	const { status } = spawnSync(process.execPath, args, { stdio: 'inherit' });
	if (status !== 0) process.exit(1);
}
