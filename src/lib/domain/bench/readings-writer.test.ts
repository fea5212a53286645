import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { isReading } from './numbers';
import { previewImport } from './readings-import';
import { exportColumns, readingsHeader, readingsLines, type ExportedReading } from './readings-writer';

const profiles = ['stock', 'all-core'].map((slug) => ({ slug, name: slug }));
const workloads = [
	{ slug: 'prime-search', name: 'Prime search', unit: 'events/s' },
	{ slug: 'heat-soak', name: 'Heat soak', unit: 'µK, “over”' }
];
const target = { profiles, workloads, zone: 'Europe/Oslo' };

const file = (rows: ExportedReading[]) => readingsHeader() + readingsLines(rows);

const row: ExportedReading = {
	profile: 'stock',
	workload: 'prime-search',
	run: 1,
	repeat: 1,
	value: 4568.98,
	unit: 'events/s',
	startedAt: new Date('2026-11-11T08:40:00.250Z'),
	ambientC: 21.3,
	tester: 'Tomas',
	source: 'grid',
	excludedReason: null,
	voidedReason: null,
	notes: ''
};

/** Text as the forms keep it: trimmed, with line ends as a line feed. */
const words = (max: number) =>
	fc
		.oneof(
			fc.string({ maxLength: max, unit: 'grapheme' }),
			fc.constantFrom('=1+1', "'=1", '-3 %', '+', '@home', 'a,b', 'say "so"', 'one\ntwo', '; tab\tin')
		)
		.map((text) => text.replace(/\r\n?/g, '\n').replaceAll('\u0000', '').trim());

const measured = fc
	.oneof(
		fc.double({ noNaN: true, noDefaultInfinity: true }),
		fc.double({ min: -1000, max: 1000, noNaN: true }),
		fc.integer()
	)
	.filter(isReading)
	.map((value) => (value === 0 ? 0 : value));

const runs = fc
	.array(
		fc.record({
			profile: fc.constantFrom('stock', 'all-core'),
			workload: fc.constantFrom(...workloads),
			startedAt: fc.date({
				min: new Date('1970-01-02T00:00:00Z'),
				max: new Date('2999-12-31T00:00:00Z'),
				noInvalidDate: true
			}),
			ambientC: fc.option(fc.double({ min: -60, max: 100, noNaN: true }).filter(isReading)),
			tester: words(60),
			source: fc.constantFrom('grid', 'api', 'csv'),
			voidedReason: fc.option(words(200).filter(Boolean)),
			notes: words(300),
			readings: fc.array(
				fc.record({ value: measured, excludedReason: fc.option(words(200).filter(Boolean)) }),
				{ minLength: 1, maxLength: 6 }
			)
		}),
		{ minLength: 1, maxLength: 8 }
	)
	.map((list) =>
		list.flatMap(({ readings, workload, ...run }, at) =>
			readings.map((reading, index): ExportedReading => ({
				...run,
				workload: workload.slug,
				unit: workload.unit,
				...reading,
				run: at + 1,
				repeat: index + 1
			}))
		)
	);

describe('a campaign as a file', () => {
	it('comes back the same: any readings, any words, to the last bit', () => {
		fc.assert(
			fc.property(runs, (rows) => {
				const found = previewImport(file(rows), target);
				expect(found.ok && found.rows.map((one) => ('taken' in one ? one.taken : one.refused))).toEqual(
					rows.map(({ unit: _, startedAt, excludedReason, voidedReason, ambientC, ...kept }) => ({
						...kept,
						ambientC: ambientC === 0 ? 0 : ambientC,
						startedAt: startedAt.toISOString(),
						excludedReason: excludedReason ?? '',
						voidedReason: voidedReason ?? ''
					}))
				);
				if (!found.ok) return;
				const back = found.rows.map((one) => ('taken' in one ? one.taken.value : null));
				expect(back.every((value, at) => Object.is(value, rows[at]?.value))).toBe(true);
			}),
			{ numRuns: 100 }
		);
	});

	// RFC 4180, section 2: lines end in CRLF, each has as many cells as the header, quotes are doubled within quotes.
	it('is written as RFC 4180 says', () => {
		const text = file([{ ...row, notes: 'He said "no",\nthen left' }]);
		expect(text).toBe(
			`${exportColumns.join(',')}\r\n` +
				'stock,prime-search,1,1,4568.98,events/s,2026-11-11T08:40:00.250Z,21.3,Tomas,grid,,,"He said ""no"",\nthen left"\r\n'
		);
	});

	it('keeps words from being a formula in a spreadsheet, and leaves numbers alone', () => {
		const text = file([{ ...row, value: -1.5, notes: '=HYPERLINK("x")', excludedReason: '-3 %' }]);
		const [cells] = Papa.parse<Record<string, string>>(text.trimEnd(), { header: true }).data;
		expect(cells).toMatchObject({
			value: '-1.5',
			notes: '\'=HYPERLINK("x")',
			excluded_reason: "'-3 %"
		});
	});
});
