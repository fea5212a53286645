import Papa from 'papaparse';
import { describe, expect, it, vi } from 'vitest';
import { measuredArticle, measuredCampaign, reference } from '../../../../tests/fixtures/article-data';
import { canonicalJson, editionHash, freezeEdition } from './freeze-edition';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

const source =
	'## Builds\n\nA build takes :reading{workload=source-build profile=stock}.\n\n::plate{kind=scores workload=source-build}\n\n::plate{kind=gains}\n\n::disclosure';
const input = () => ({
	slug: 'two-cores',
	title: 'Two cores',
	standfirst: 'Four ways.',
	source,
	data: measuredArticle()
});

describe('an edition', () => {
	const edition = freezeEdition(input());
	it('is the same when it is made again', () => {
		expect(freezeEdition(input())).toEqual(edition);
		expect(edition.hash).toMatch(/^[0-9a-f]{64}$/);
	});
	it.each([
		['title', { title: 'Two cores more' }],
		['standfirst', { standfirst: 'Five ways.' }],
		['source', { source: `${source} ` }],
		['data', { data: { ...measuredArticle(), zone: 'UTC' } }]
	])('has another hash when its %s is another', (_, change) => {
		expect(freezeEdition({ ...input(), ...change }).hash).not.toBe(edition.hash);
	});
	it('has another hash when its page or a plate is another', () => {
		const parts = { ...input(), page: edition.page, plates: edition.plates };
		expect(editionHash(parts)).toBe(edition.hash);
		expect(editionHash({ ...parts, page: `${edition.page} ` })).not.toBe(edition.hash);
		const [first, ...rest] = edition.plates;
		if (!first) throw new Error('There is no plate.');
		expect(editionHash({ ...parts, plates: [{ ...first, csv: `${first.csv}x` }, ...rest] })).not.toBe(
			edition.hash
		);
	});
	it('does not care for the order in which data were put together', () => {
		expect(canonicalJson({ b: 1, a: [{ d: null, c: 'x' }] })).toBe('{"a":[{"c":"x","d":null}],"b":1}');
	});
	it('keeps its page apart from what the bench does later', () => {
		const data = measuredArticle();
		const before = freezeEdition({ ...input(), data });
		const cell = data.campaigns[0]?.cells.find(
			(one) => one.workload === 'source-build' && one.profile === 'stock'
		);
		if (cell?.summary) cell.summary.mean = 99;
		expect(before.page).toContain('3.083&nbsp;s');
	});
	it('links the files of its plates under its own address', () => {
		for (const { key } of edition.plates)
			expect(edition.page).toContain(`href="/articles/two-cores/plates/${key}.csv"`);
		expect(edition.plates.every(({ key }) => key.length <= 60)).toBe(true);
	});
	it('says which parts, testers and results it prints', () => {
		expect(edition.partSlugs).toEqual(['aldermoor-1650', 'brisk-360', 'pennon-2x16']);
		expect(edition.testerNames).toEqual(['Tomas Reyl']);
		// Four bars of one workload, and the dots of all seven workloads with their baseline.
		expect(edition.results).toHaveLength(28);
	});
});

// Outside check: R 4.2.2 on the same readings (tests/fixtures/reference.txt); RFC 4180 as another library reads it.
describe('the CSV of a plate', () => {
	const edition = freezeEdition(input());
	const rows = (kind: string) => {
		const csv = edition.plates.find((plate) => plate.kind === kind)?.csv ?? '';
		expect(csv.endsWith('\r\n')).toBe(true);
		const { data, errors } = Papa.parse<Record<string, string>>(csv.trim(), {
			header: true,
			newline: '\r\n'
		});
		expect(errors).toEqual([]);
		return data;
	};
	const slug = (name = '') => name.toLowerCase().replace(/ /g, '-');
	it('has the bars at full precision', () => {
		const cells = reference().cells.filter((cell) => cell.workload === 'source-build');
		expect(rows('scores')).toHaveLength(cells.length);
		for (const row of rows('scores')) {
			const cell = cells.find((one) => one.profile === slug(row.profile));
			expect(Number(row.mean)).toBeCloseTo(cell?.mean ?? NaN, 10);
			expect(Number(row.ci95_low)).toBeCloseTo(cell?.ci95[0] ?? NaN, 9);
			expect(Number(row.sd)).toBeCloseTo(cell?.sd ?? NaN, 10);
		}
	});
	it('has the gains at full precision', () => {
		const { ratios } = reference();
		expect(rows('gains')).toHaveLength(ratios.length);
		for (const row of rows('gains')) {
			const ratio = ratios.find(
				(one) => one.workload === row.workload && one.profile === slug(row.profile)
			)?.ratio;
			expect(Number(row.ratio)).toBeCloseTo(ratio ?? NaN, 10);
		}
	});
	it('quotes what must be quoted and runs no formula', () => {
		const campaign = measuredCampaign();
		const [first, second] = campaign.profiles;
		if (first) first.name = 'a,"b"\r\nc';
		if (second) second.name = '=1+1';
		const data = { ...measuredArticle(), campaigns: [campaign] };
		const csv = freezeEdition({ ...input(), data }).plates[0]?.csv ?? '';
		expect(csv).toContain('"a,""b""\r\nc",source-build');
		expect(csv).toContain("'=1+1,source-build");
	});
});
