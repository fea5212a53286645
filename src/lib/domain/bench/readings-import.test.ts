import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { previewImport, type ImportPreview } from './readings-import';

const target = {
	profiles: [
		{ slug: 'stock', name: 'Stock' },
		{ slug: 'all-core', name: 'All-core ratio' }
	],
	workloads: [
		{ slug: 'prime-search', name: 'Prime search', unit: 'events/s' },
		{ slug: 'source-build', name: 'Source build', unit: 's' }
	],
	zone: 'Europe/Oslo'
};

function preview(text: string): ImportPreview {
	const found = previewImport(text, target);
	if (!found.ok) throw new Error(found.message);
	return found;
}

const whole = (text: string): string => {
	const found = previewImport(text, target);
	return found.ok ? 'taken' : found.message;
};

const only = (text: string) =>
	preview(`profile,workload,value,unit,repeat,started_at,ambient_c,notes\n${text}`).rows[0];

describe('preview of an import', () => {
	it('takes every row of the measured readings, to the last digit', () => {
		const text = readFileSync('tests/fixtures/readings.csv', 'utf8');
		const rows = text
			.trim()
			.split('\n')
			.slice(1)
			.map((row) => row.split(','));
		const measured = {
			profiles: [...new Set(rows.map((row) => row[0] ?? ''))].map((slug) => ({ slug, name: slug })),
			workloads: [...new Map(rows.map((row) => [row[1] ?? '', row[2] ?? '']))].map(([slug, unit]) => ({
				slug,
				name: slug,
				unit
			})),
			zone: 'UTC'
		};
		const found = previewImport(text, measured);
		expect(found).toMatchObject({ ok: true, taken: 196, refused: 0, ignored: ['better', 'class'] });
		if (!found.ok) return;
		expect(found.rows.map((row) => ('taken' in row ? row.taken.value : null))).toEqual(
			rows.map((row) => Number(row[6]))
		);
		expect(found.rows[0]).toEqual({
			line: 2,
			taken: {
				profile: 'stock',
				workload: 'prime-search',
				value: 4568.98,
				run: null,
				repeat: 1,
				startedAt: '2026-12-01T03:55:13.032Z',
				ambientC: null,
				tester: '',
				source: '',
				excludedReason: '',
				voidedReason: '',
				notes: ''
			}
		});
	});

	it.each([
		['commas', 'profile,workload,value\nstock,source-build,3.084\n'],
		['tabs', 'profile\tworkload\tvalue\nstock\tsource-build\t3.084\n'],
		['semicolons and decimal commas', 'profile;workload;value\nstock;source-build;3,084\n'],
		['a byte-order mark and CRLF', '\ufeffprofile,workload,value\r\nstock,source-build,3.084\r\n'],
		['another order and case', 'Value , WORKLOAD,Profile\n3.084,Source Build,STOCK'],
		['quotes', '"profile","workload","value"\n"stock","source-build","3.084"'],
		['blank lines', '\n\nprofile,workload,value\n\nstock,source-build,3.084\n\n\n'],
		['cells beyond, all empty', 'profile,workload,value,,\nstock,source-build,3.084,,\n']
	])('reads %s', (_, text) => {
		expect(preview(text)).toMatchObject({
			taken: 1,
			refused: 0,
			rows: [{ taken: { profile: 'stock', workload: 'source-build', value: 3.084 } }]
		});
	});

	it('counts lines as an editor does, over quoted line breaks and blank lines', () => {
		const found = preview(
			'profile,workload,value,notes\nstock,source-build,3,"a\nb"\n\nstock,source-build,x,\n'
		);
		expect(found.rows.map((row) => row.line)).toEqual([2, 5]);
		expect(found.rows[0]).toMatchObject({ taken: { notes: 'a\nb' } });
		expect(found.rows[1]).toMatchObject({ raw: 'stock,source-build,x,' });
	});

	it.each([
		['stock,prime-search,fast', 'not a number'],
		['stock,prime-search,NaN', 'not a measured value'],
		['stock,prime-search,Infinity', 'not a measured value'],
		['stock,prime-search,1e400', 'too large'],
		['stock,prime-search,4686 events/s', 'without its unit'],
		['stock,prime-search,', 'value is missing'],
		['stock,prime-search,"1,234"', 'two ways'],
		['stock,prime-search,1,s', 'measured in events/s'],
		['stokc,prime-search,1', 'Nearest: stock'],
		['stock,prime-serch,1', 'Nearest: prime-search'],
		[',prime-search,1', 'profile is missing'],
		['stock,zzzz,1', 'no workload “zzzz”.'],
		['stock,prime-search,1,,0', 'whole number'],
		['stock,prime-search,1,,1.5', 'whole number'],
		['stock,prime-search,1,,,yesterday', 'not understood'],
		['stock,prime-search,1,,,2026-02-30T10:00:00Z', 'not understood'],
		['stock,prime-search,1,,,0001-01-01T10:00:00Z', 'not understood'],
		['stock,prime-search,1,,,,warm', 'Ambient temperature'],
		['stock,prime-search,1,,,,400', 'between'],
		['stock,prime-search,1,,,,,note,more', 'more cells'],
		[`stock,prime-search,1,,,,,${'x'.repeat(5001)}`, 'longer than']
	])('refuses %s', (row, reason) => {
		expect(only(row)).toMatchObject({
			line: 2,
			refused: expect.stringContaining(reason) as unknown,
			raw: row
		});
	});

	it('keeps times in UTC, reading those without a zone in the publication’s', () => {
		const start = (text: string) => only(`stock,prime-search,1,,,${text}`);
		expect(start('2026-07-01T10:00:00+05:00')).toMatchObject({
			taken: { startedAt: '2026-07-01T05:00:00.000Z' }
		});
		expect(start('2026-07-01 10:00')).toMatchObject({ taken: { startedAt: '2026-07-01T08:00:00.000Z' } });
		expect(start('2026-01-01T10:00')).toMatchObject({ taken: { startedAt: '2026-01-01T09:00:00.000Z' } });
	});

	it('takes the first of a repeat that is there twice, and any number without one', () => {
		const found = preview(
			'profile,workload,value,repeat\nstock,source-build,3,1\nstock,source-build,3.1,1\nall-core,source-build,3,1'
		);
		expect(found).toMatchObject({ taken: 2, refused: 1 });
		expect(found.rows[1]).toMatchObject({ line: 3, refused: expect.stringContaining('line 2') as unknown });
		expect(preview('profile,workload,value\nstock,source-build,3\nstock,source-build,3')).toMatchObject({
			taken: 2
		});
	});

	it('lets the clear numbers of a file settle the unclear ones', () => {
		const found = preview('profile\tworkload\tvalue\nstock\tsource-build\t1,234\nstock\tsource-build\t2,5');
		expect(found).toMatchObject({
			decimalMark: 'comma',
			rows: [{ taken: { value: 1.234 } }, { taken: { value: 2.5 } }]
		});
	});

	it('keeps text as text', () => {
		expect(only('stock,source-build,3,,,,,<script>alert(1)</script>')).toMatchObject({
			taken: { notes: '<script>alert(1)</script>' }
		});
		expect(only('<script>,source-build,3')).toMatchObject({
			refused: expect.stringContaining('“<script>”') as unknown
		});
	});

	it.each([
		['', 'empty'],
		['\ufeff\r\n', 'empty'],
		['profile,workload,value\n', 'no readings'],
		['a,b,c\n1,2,3', 'lacks profile and workload and value'],
		['profile,workload\nstock,source-build', 'lacks value'],
		['profile,workload,value,value\nstock,source-build,1,2', 'there twice'],
		['profile,workload,value\nstock,"source-build,1\nstock,source-build,2', 'line 2 do not close'],
		[`profile,workload,value\n${'stock,source-build,1\n'.repeat(10_001)}`, 'more than 10,000'],
		['x'.repeat(100_000_000), 'too large']
	])('refuses a file whole: %#', (text, reason) => {
		expect(whole(text)).toContain(reason);
	});

	it('takes ten thousand rows', () => {
		expect(preview(`profile,workload,value\n${'stock,source-build,1\n'.repeat(10_000)}`).taken).toBe(10_000);
	});
});

describe('a file that numbers its runs', () => {
	const head = 'profile,workload,value,run,repeat,excluded_reason,voided_reason';
	const rowsOf = (...lines: string[]) => preview([head, ...lines].join('\n')).rows;

	it('may number the same repeats in each', () => {
		expect(
			rowsOf('stock,prime-search,1,1,1,,', 'stock,prime-search,2,2,1,,', 'stock,prime-search,3,2,1,,')
		).toMatchObject([
			{ taken: { run: 1, repeat: 1 } },
			{ taken: { run: 2, repeat: 1 } },
			{ refused: 'Repeat 1 of run 2 of this cell is on line 3 already.' }
		]);
	});

	it('voids a run as a whole or not at all', () => {
		expect(
			rowsOf('stock,prime-search,1,1,1,,wrong profile', 'stock,prime-search,2,1,2,slipped,')
		).toMatchObject([
			{ taken: { voidedReason: 'wrong profile' } },
			{ refused: expect.stringContaining('differs from that on line 2') }
		]);
	});

	it('is refused a run that is no number', () => {
		expect(rowsOf('stock,prime-search,1,first,1,,')).toMatchObject([
			{ refused: 'The run “first” is not a whole number from 1 to 999999.' }
		]);
	});
});
