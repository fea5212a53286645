import { describe, expect, it } from 'vitest';
import { standingOf } from './quote';

const page =
	'A fixed clock wins the long renders. Held at 4.95 GHz the processor finishes the tile render in 31.2 s, which is 12.4 % faster than stock. The prime sieve goes the other way.';

const words = (quote: string, text = page) => {
	const found = standingOf(quote, text);
	return found && { text: text.slice(found.from, found.to), exact: found.exact };
};

describe('a comment’s passage', () => {
	it('is found word for word, whatever the spaces, the case and the marks around it', () => {
		expect(words('the tile\n render in 31.2 s')).toEqual({ text: 'the tile render in 31.2 s', exact: true });
		expect(words('“The prime sieve”')).toEqual({ text: 'The prime sieve', exact: true });
	});

	it('is found whichever apostrophe was typed', () => {
		expect(words('Everybody’s modules', "One more. Everybody's modules are fine.")).toEqual({
			text: "Everybody's modules",
			exact: true
		});
	});

	it('ends with its own last word when something was put before it', () => {
		const text = 'Most modules are fine at that voltage for years. Caution: more voltage means more heat.';
		expect(words('Everybody agrees modules are fine at that voltage for years', text)?.text).toBe(
			'modules are fine at that voltage for years'
		);
	});

	it('is followed as the text moves', () => {
		const moved = `One more paragraph before it.\n\n${page}`;
		expect(words('Held at 4.95 GHz', moved)).toEqual({ text: 'Held at 4.95 GHz', exact: true });
	});

	it('is found again when a few of its words changed, and says so', () => {
		const edited = page.replace('31.2 s', '30.9 s').replace('finishes', 'completes');
		const found = words('the processor finishes the tile render in 31.2 s', edited);
		expect(found?.exact).toBe(false);
		expect(found?.text).toContain('completes the tile render');
	});

	it('is not found once most of it is gone', () => {
		expect(words('the memory kit needs another sub-timing to be stable')).toBeNull();
		expect(words('')).toBeNull();
	});
});
