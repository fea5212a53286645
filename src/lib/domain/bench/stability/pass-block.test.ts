import { describe, expect, it } from 'vitest';
import { passBlock } from './pass-block';

describe('a pasted pass', () => {
	it('takes tabs, semicolons or spaces, a line of headings and decimal commas', () => {
		const rows = [
			{ threads: '1', currentA: '14,1', clockMHz: '5550' },
			{ threads: '2', currentA: '23', clockMHz: '5500' }
		];
		for (const text of [
			'Threads\tCurrent\tClock\n1\t14,1\t5550\r\n2\t23\t5500\n',
			'1; 14,1; 5550\n2;23;5500',
			'1 14,1 5550\n\n2  23 5500'
		])
			expect(passBlock(text)).toMatchObject({ ok: true, rows });
	});

	it('tells the line of each row, headings and empty lines counted', () => {
		expect(passBlock('Threads A MHz\n1 14 5550\n\n2 23 5500')).toMatchObject({ lines: [2, 4] });
	});

	it('refuses a line without three cells, and names it', () => {
		for (const text of ['1 14 5550\n2 23', '1 14 5550\n2 23 5500 80'])
			expect(passBlock(text)).toMatchObject({ ok: false, message: expect.stringContaining('Line 2') });
		expect(passBlock('')).toMatchObject({ ok: false });
	});
});
