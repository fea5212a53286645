import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sameSitePath } from './same-site';

describe('sameSitePath', () => {
	it.each(['/bench', '/bench?sort=name&q=a%20b', '/desk/articles/x#second', '/'])('keeps %s', (path) => {
		expect(sameSitePath(path, '/desk')).toBe(path);
	});

	it.each([
		null,
		'',
		'bench',
		'https://elsewhere.example/',
		'//elsewhere.example/x',
		'/\\elsewhere.example',
		'\\\\elsewhere.example',
		'/\t/elsewhere.example',
		'/\n//elsewhere.example',
		'/.//elsewhere.example',
		'javascript:alert(1)'
	])('falls back for %j', (path) => {
		expect(sameSitePath(path, '/desk')).toBe('/desk');
	});

	it('never leads off the site, whatever is given', () => {
		fc.assert(
			fc.property(
				fc.string({ unit: 'binary' }),
				fc.constantFrom('', '/', '//', '/\\', '/.', 'http:'),
				(text, start) => {
					const path = sameSitePath(start + text, '/desk');
					expect(new URL(path, 'https://here.example').origin).toBe('https://here.example');
					expect(path).toMatch(/^\/(?!\/)/);
				}
			)
		);
	});
});
