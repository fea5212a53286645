import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { columns, readReadingsCsv } from './readings-csv';

const empty = Object.fromEntries(columns.map((column) => [column, '']));

// RFC 4180: quotes around a field with the delimiter, a line break or a quote in it; a quote inside is doubled.
describe('a CSV of readings', () => {
	it('keeps what quotes hold together', () => {
		expect(
			readReadingsCsv('profile,workload,value,notes\r\nstock,build,"1,5","a ""b"", c\r\nd"\r\n')
		).toEqual({
			ok: true,
			delimiter: ',',
			ignored: [],
			lines: [
				{
					line: 2,
					raw: 'stock,build,"1,5","a ""b"", c\nd"',
					cells: {
						...empty,
						profile: 'stock',
						workload: 'build',
						value: '1,5',
						notes: 'a "b", c\nd'
					},
					overflows: false
				}
			]
		});
	});

	it('takes headings as people write them', () => {
		expect(
			readReadingsCsv('Profile;Workload;Value;Started at;Ambient-C;Remark\nstock;build;1;2026-05-01;21;x')
		).toMatchObject({
			delimiter: ';',
			ignored: ['Remark'],
			lines: [{ cells: { started_at: '2026-05-01', ambient_c: '21' } }]
		});
	});

	it('sees a line that has more cells than headings', () => {
		expect(
			readReadingsCsv('profile,workload,value\nstock,build,1,5\nstock,build,1,\nstock,build')
		).toMatchObject({
			lines: [{ overflows: true }, { overflows: false }, { overflows: false, cells: { value: '' } }]
		});
	});

	it('reads back what a well-kept writer wrote, with each delimiter', () => {
		const cell = fc.stringMatching(/^[a-z0-9 ,;"'.=-]{0,8}$/).map((text) => text.trim());
		const row = fc.record({
			profile: cell.filter((text) => text !== ''),
			workload: cell,
			value: cell,
			notes: cell
		});
		fc.assert(
			fc.property(
				fc.array(row, { minLength: 1, maxLength: 5 }),
				fc.constantFrom(',', ';', '\t'),
				(rows, delimiter) => {
					const table = readReadingsCsv(Papa.unparse(rows, { delimiter }));
					expect(table.ok && table.lines.map(({ cells }) => cells)).toEqual(
						rows.map((given) => ({ ...empty, ...given }))
					);
				}
			)
		);
	});
});
