import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalMarkOf, isReading, parseBlock, parseReading } from './numbers';

const value = (text: string, decimal?: Parameters<typeof parseReading>[1]) => {
	const parsed = parseReading(text, decimal);
	return parsed.ok ? parsed.value : parsed.message;
};

describe('a written reading', () => {
	it.each([
		['4686.72', 4686.72],
		['4686,72', 4686.72],
		[' 0,423 ', 0.423],
		['3 322 298.25', 3322298.25],
		['3\u00a0322\u00a0298,25', 3322298.25],
		['3\u2009322\u2009298', 3322298],
		['3\u202f322', 3322],
		['-5', -5],
		['\u22125,5', -5.5],
		['+5', 5],
		['.5', 0.5],
		['5.', 5],
		['1e3', 1000],
		['1.5E+03', 1500],
		['007', 7],
		['-0', 0]
	])('%j is %d', (text, expected) => {
		expect(value(text)).toBe(expected);
	});

	it.each([
		['', 'Enter a number'],
		['   ', 'Enter a number'],
		['fast', 'is not a number'],
		['NaN', 'not a measured value'],
		['-Infinity', 'not a measured value'],
		['inf', 'not a measured value'],
		['1e400', 'too large'],
		['-1e400', 'too large'],
		['1e999999', 'too large'],
		['1e-400', 'too small'],
		['1e308', 'larger than anything a bench measures'],
		['1.1e15', 'too large'],
		['-1e-101', 'too small'],
		['0x1F', 'is not a number'],
		['0b11', 'is not a number'],
		['124.5 s', 'without its unit'],
		['124.5s', 'without its unit'],
		['12 34', 'is not a number'],
		['1,234.5', 'more than one decimal mark'],
		['1.234.567', 'more than one decimal mark'],
		['1,234', 'two ways'],
		['--5', 'is not a number'],
		['5-', 'is not a number'],
		['.', 'is not a number'],
		['e5', 'is not a number'],
		['=1+1', 'is not a number'],
		['<script>alert(1)</script>', 'is not a number'],
		['9'.repeat(401), 'too long']
	])('%j is refused', (text, reason) => {
		expect(value(text)).toContain(reason);
	});

	it('follows the mark of its file', () => {
		expect(value('1,234', 'comma')).toBe(1.234);
		expect(value('1,234', 'point')).toContain('with a point');
		expect(value('1.234', 'comma')).toContain('with a comma');
	});

	it('reads back every number that is printed, to the last bit', () => {
		fc.assert(
			fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }).filter(isReading), (number) => {
				expect(value(String(number))).toBe(number === 0 ? 0 : number);
			})
		);
	});

	it('never gives what is not finite, whatever is typed', () => {
		fc.assert(
			fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[-+0-9.,eE ]{0,12}$/)), (text) => {
				const parsed = parseReading(text);
				if (parsed.ok) expect(isReading(parsed.value)).toBe(true);
				else expect(parsed.message).not.toBe('');
			})
		);
	});
});

it('is a reading only within bounds', () => {
	expect([0, -1e15, 1e-100].every(isReading)).toBe(true);
	expect([Number.NaN, Number.POSITIVE_INFINITY, 1.1e15, 1e308, -9e-101].some(isReading)).toBe(false);
});

describe('the decimal mark of a file', () => {
	it('is told by the numbers that read in one way only', () => {
		expect(decimalMarkOf(['1,234', '2,5'])).toBe('comma');
		expect(decimalMarkOf(['1.234', '2'])).toBe('point');
		expect(decimalMarkOf(['1,234', '2,345'])).toBe('either');
		expect(decimalMarkOf(['1,5', '1.5'])).toBe('either');
		expect(decimalMarkOf(['1', '2'])).toBe('either');
	});
});

describe('a pasted block', () => {
	it('keeps rows and cells', () => {
		expect(parseBlock('1\t2\r\n3\t4\r\n')).toEqual({
			ok: true,
			rows: [
				['1', '2'],
				['3', '4']
			]
		});
		expect(parseBlock('\ufeff1,5\n2,5')).toEqual({ ok: true, rows: [['1,5'], ['2,5']] });
		expect(parseBlock('1\n\n2')).toEqual({ ok: true, rows: [['1'], [''], ['2']] });
		expect(parseBlock('"a\tb"\t1')).toEqual({ ok: true, rows: [['a\tb', '1']] });
	});

	it('is refused whole when too large or empty', () => {
		expect(parseBlock('')).toMatchObject({ ok: false });
		expect(parseBlock('1\n'.repeat(10_001))).toMatchObject({ ok: false });
		expect(parseBlock('1\n'.repeat(10_000))).toMatchObject({ ok: true });
		expect(parseBlock('x'.repeat(100_000_000))).toMatchObject({ ok: false });
	});
});
