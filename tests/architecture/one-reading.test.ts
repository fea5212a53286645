import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';

const asks = /from '[^']*bench\/tuning\/(derive|consistency|limit-advice)'/;

it('a profile is read by the lab’s meanings and limits wherever it is shown: nothing derives facts on its own', () => {
	const files = readdirSync('src', { recursive: true, encoding: 'utf8' })
		.filter((name) => /\.(ts|svelte)$/.test(name) && !/^lib[\\/]domain[\\/]bench[\\/]/.test(name))
		.filter((name) => {
			const valueImports = readFileSync(join('src', name), 'utf8')
				.split('\n')
				.filter((line) => !line.trim().startsWith('import type'));
			return valueImports.some((line) => asks.test(line));
		});
	expect(files).toEqual([]);
});
