import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { around, difference, wordsChanged } from './difference';

describe('the difference of two texts', () => {
	it('is word by word', () => {
		const pieces = difference('The build gains 9 percent.', 'The build gains 12 percent at last.');
		expect(pieces.filter((piece) => piece.kind !== 'same')).toEqual([
			{ kind: 'removed', text: '9' },
			{ kind: 'added', text: '12' },
			{ kind: 'added', text: ' at last' }
		]);
		expect(wordsChanged(pieces)).toEqual({ added: 3, removed: 1 });
	});

	it('gives both texts back, whatever they are', () => {
		const text = fc
			.array(fc.constantFrom('a', 'b', ' ', '\n', 'clock', '4.95'))
			.map((parts) => parts.join(''));
		fc.assert(
			fc.property(text, text, (before, after) => {
				const pieces = difference(before, after);
				const side = (without: string) =>
					pieces
						.filter((piece) => piece.kind !== without)
						.map((piece) => piece.text)
						.join('');
				expect(side('added')).toBe(before);
				expect(side('removed')).toBe(after);
			})
		);
	});

	it('leaves out long unchanged parts and says how much', () => {
		const lines = Array.from({ length: 40 }, (_, index) => `line ${index}`).join('\n');
		const shown = around(difference(lines, `${lines}\nand one more`));
		expect(shown[0]).toEqual({ kind: 'skipped', lines: 38 });
		expect(shown.at(-1)).toMatchObject({ kind: 'added' });
	});
});
