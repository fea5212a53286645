import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { curlLine, filledIn } from './curl-line';

/** What a POSIX shell hands to curl: sh itself is the reference (POSIX.1-2017, Shell Command Language, 2.2). */
const handed = (line: string): string[] =>
	execFileSync('sh', ['-c', `curl() { printf '%s\\n' "$@"; }; uuidgen() { echo key-1; }; ${line}`], {
		env: { PATH: process.env.PATH, TOKEN: 'secret' },
		encoding: 'utf8'
	})
		.trim()
		.split('\n');

describe('the line for a shell', () => {
	it('reaches curl as address, headers and body, whatever stands in the body', () => {
		const body = { notes: `it's “5 °C” $HOME \`id\` \\ "quoted"`, clockMHz: 4900 };
		const words = handed(curlLine('https://lab.example', '/api/v1/x', body));
		expect(words).toEqual([
			'-X',
			'POST',
			'https://lab.example/api/v1/x',
			'-H',
			'Authorization: Bearer secret',
			'-H',
			'Content-Type: application/json',
			'-H',
			'Idempotency-Key: key-1',
			'-d',
			JSON.stringify(body)
		]);
	});
});

describe('what a form would send', () => {
	it('leaves blank fields out, also in its lines, and keeps nought, no and an empty list', () => {
		expect(
			filledIn({
				name: 'first',
				slug: '',
				count: 0,
				sure: false,
				note: null,
				lines: [{ workload: 'render', minutes: '' }],
				none: []
			})
		).toEqual({ name: 'first', count: 0, sure: false, lines: [{ workload: 'render' }], none: [] });
	});
});
