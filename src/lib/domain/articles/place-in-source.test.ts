import { describe, expect, it } from 'vitest';
import { placeInSource } from './place-in-source';

describe('a place on the page', () => {
	const source = 'The render takes :reading{workload=render} and the render **ends**.\n\nrender';
	const text = 'The render takes 31.2 s and the render ends.';
	it('is found in the source, the same word of several, as far into it', () => {
		expect(placeInSource(source, text, text.lastIndexOf('render') + 3)).toBe(
			source.indexOf('render **ends') + 3
		);
		expect(placeInSource(source, text, text.indexOf('ends'))).toBe(source.indexOf('ends'));
	});
	it('is the beginning of its block where the source says it in other words', () => {
		expect(placeInSource(source, text, text.indexOf('31.2'))).toBe(0);
		expect(placeInSource(source, text, text.length)).toBe(0);
	});
});
