import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

/** Every file below a folder. */
const filesOf = (folder: string): string[] =>
	readdirSync(folder, { recursive: true, encoding: 'utf8' }).map((name) => join(folder, name));
const modules = filesOf('src/routes').filter((file) =>
	/\+(page|layout)\.server\.ts$|\+server\.ts$/.test(file)
);
const source = (file: string) => readFileSync(file, 'utf8');

/** What a module exports that a request can reach, with the text of its right-hand side. */
function handlers(file: string): { name: string; text: string }[] {
	const text = source(file);
	const found = [
		...text.matchAll(
			/export const (load|GET|POST|PUT|PATCH|DELETE|HEAD|OPTIONS|fallback)\b[^=]*=\s*([\s\S]{0,200})/g
		)
	].map((m) => ({ name: m[1] ?? '', text: m[2] ?? '' }));
	const actions = /export const actions\b[^=]*=\s*\{([\s\S]*?)\n\}/.exec(text)?.[1];
	const acts =
		actions === undefined
			? []
			: [...actions.matchAll(/^\t(\w+|'[\w-]+'):\s*([\s\S]{0,120})/gm)].map((m) => ({
					name: `actions.${m[1] ?? ''}`,
					text: m[2] ?? ''
				}));
	return [...found, ...acts];
}

describe('every handler', () => {
	it.each(modules)('%s names the act it needs, or says that it is open', (file) => {
		const found = handlers(file);
		expect(found.length, 'a server module of a route exports a handler').toBeGreaterThan(0);
		for (const { name, text } of found) {
			// A name of the file's own may stand for the handler, or make it: its definition is read instead.
			const own = /^(?!guarded|open)(\w+)[;(,]/.exec(text)?.[1];
			const meant = own ? (source(file).split(`const ${own} = `)[1] ?? '') : text;
			expect(`${name} = ${meant.slice(0, 400)}`).toMatch(/(= |=> |return |\n\t*)(guarded|guardedApi|open)\(/);
		}
	});

	it('of a layout is open: a layout never guards', () => {
		for (const file of modules.filter((name) => name.endsWith('+layout.server.ts'))) {
			for (const { text } of handlers(file)) expect(text, file).toMatch(/^open\(/);
		}
	});

	it('leaves the database to services', () => {
		for (const file of modules)
			expect(source(file), file).not.toMatch(/from '(drizzle-orm|mysql2|\$lib\/server\/db\/)/);
	});
});

describe('the tree', () => {
	it('has a lock file without download addresses', () => {
		expect(readFileSync('package-lock.json', 'utf8')).not.toContain('"resolved"');
	});

	it('has no test switched off, singled out or asleep', () => {
		for (const file of [...filesOf('tests'), ...filesOf('src')].filter(
			(name) => /\.(test|spec)\.ts$/.test(name) && !name.startsWith('tests/architecture')
		)) {
			const text = source(file);
			expect(text, file).not.toMatch(/\b(it|test|describe)\.(only|skip|todo|fixme)\b/);
			expect(text, file).not.toMatch(/waitForTimeout|(?<!test\.)setTimeout\(/);
		}
	});

	it('fetches nothing from outside: pages and styles name no other host', () => {
		for (const file of filesOf('src').filter((name) => /\.(svelte|css|html|svx)$/.test(name))) {
			expect(source(file), file).not.toMatch(
				/(src|href)=["']https?:\/\/(?!localhost)|url\(["']?https?:|@import ["']https?:/
			);
		}
	});
});
