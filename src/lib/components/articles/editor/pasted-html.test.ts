import { readFileSync } from 'node:fs';
import { JSDOM } from 'jsdom';
import { describe, expect, it } from 'vitest';
import { pastedHtml } from './pasted-html';

// Clipboards with invented content in the shape that programs write them.
const clipboard = (name: string): string =>
	readFileSync(new URL(`../../../../../tests/fixtures/clipboard/${name}.html`, import.meta.url), 'utf8');
const paste = (html: string) => pastedHtml(html, new new JSDOM().window.DOMParser());

describe('what is pasted', () => {
	it('from a word processor becomes headings, lists, marks, links and tables; pictures are left out and counted', () => {
		expect(paste(clipboard('word-processor'))).toEqual({
			pictures: 1,
			markdown: [
				'## A quiet evening with the Pennon',
				'## What we heard',
				'The fan is **audible** at 40 %, and *hardly* so below. See [how we listen](https://northlight.example/method), or the notes.',
				'- Side panel on\n  - felt strips **in**\n- Side panel off',
				'1. Warm up\n2. Listen',
				'| **Fan** | **Noise, dB(A)** |\n| ---: | ---: |\n| 40 % | 31.5 |'
			].join('\n\n')
		});
	});

	it('from an online writer keeps what is bold, and not what only says so', () => {
		expect(paste(clipboard('online-writer'))?.markdown).toBe(
			'## What stock does\n\nLeft alone, the board spends a **budget** *quickly*.\n\n- One core\n- All cores'
		);
	});

	it('from a spreadsheet becomes a table, numbers at the right', () => {
		expect(paste(clipboard('spreadsheet'))?.markdown).toBe(
			'| Profile | Time, s | a\\|b |\n| --- | ---: | --- |\n| Stock | 31.40 |  |\n| Fixed 4.95 | 28.10 | warm |'
		);
	});

	it('is left as text where its HTML says no more', () => {
		expect(paste(clipboard('code-editor'))).toBeNull();
		expect(paste('<p>Only words.</p>')).toBeNull();
	});

	it('brings no script and no address that leads nowhere', () => {
		const pasted = paste(
			'<h2 onclick="x()">Head</h2><script>alert(1)</script><p><a href="javascript:alert(1)">go</a> <a href="#top">up</a></p>'
		);
		expect(pasted?.markdown).toBe('## Head\n\ngo up');
	});
});
