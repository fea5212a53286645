import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lexMarkdown } from './markdown';
import { tableOfBlock } from './pasted-table';

describe('a block of a spreadsheet', () => {
	it('becomes a table with its numbers at the right', () => {
		expect(tableOfBlock('Profile\tTime, s\tNote\r\nStock\t31,4\tcold\r\nFixed 4.95\t28,1\t\r\n')).toBe(
			'| Profile | Time, s | Note |\n| --- | ---: | --- |\n| Stock | 31,4 | cold |\n| Fixed 4.95 | 28,1 |  |'
		);
	});

	it('keeps line breaks inside of quoted cells in their cell', () => {
		expect(tableOfBlock('a\t"b\nc"\n1\t2')).toBe('| a | b c |\n| ---: | ---: |\n| 1 | 2 |');
	});

	it('is left alone where it is none: one column, ragged rows, indented code', () => {
		for (const text of ['a\nb', 'a\tb\nc', '\tif (x)\n\t\treturn;', 'one\ttab in a sentence'])
			expect(tableOfBlock(text)).toBeNull();
	});

	it('is read back as the same cells, whatever they hold', () => {
		const word = fc.string({ unit: fc.constantFrom(...'ab|\\*_`<>[]1. '), maxLength: 6 });
		fc.assert(
			fc.property(fc.array(fc.tuple(word, word), { minLength: 2, maxLength: 4 }), (rows) => {
				const text = rows.map(([a, b]) => `x${a}y\tx${b}y`).join('\n');
				const [table] = lexMarkdown(tableOfBlock(text) ?? '');
				if (table?.type !== 'table') throw new Error('no table');
				const shown = [table.header, ...(table.rows as unknown[])] as {
					tokens: { text: string; raw: string }[];
				}[][];
				const plain = (cell?: { tokens: { text: string }[] }) => cell?.tokens.map((one) => one.text).join('');
				expect(shown.map((row) => row.map(plain))).toEqual(
					rows.map((row) => row.map((cell) => `x${cell}y`.replace(/ +/g, ' ')))
				);
			})
		);
	});
});
