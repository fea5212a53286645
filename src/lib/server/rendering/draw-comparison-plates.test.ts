import { describe, expect, it, vi } from 'vitest';
import { measuredArticle, reference } from '../../../../tests/fixtures/article-data';
import { plateCsv, plateTable } from '../../domain/articles/plates/numbers';
import type { PlateSpec } from '../../domain/articles/plates/spec';
import { renderArticle } from '../../domain/articles/render-article';
import { drawPlate } from './draw-plate';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

const drifting = {
	...measuredArticle(),
	drifts: [
		{
			rig: { slug: 'n-12', name: 'N-12' },
			workload: { slug: 'source-build', name: 'Source build', unit: 's', better: 'lower' as const },
			runs: [31.2, 31.4, 31.1, 31.3, 31.2, 31.5, 31.2, 31.3, 31.2, 33.1, 31.3].map((mean, index) => ({
				run: index + 1,
				campaign: 'two-cores',
				campaignName: 'Two cores',
				revision: 3,
				at: new Date(Date.UTC(2026, 9, index + 1)).toISOString(),
				values: [mean]
			}))
		}
	]
};

function specOf(source: string): PlateSpec {
	const { plates, errors } = renderArticle(source, drifting, () => '');
	const spec = plates[0]?.spec;
	if (!spec) throw new Error(errors[0]?.message ?? 'There is no plate.');
	return spec;
}
const sources = [
	'::plate{kind=overall}',
	'::plate{kind=trade-off}',
	'::plate{kind=value per=price workload=prime-search}',
	'::plate{kind=drift rig=n-12 workload=source-build}'
];

describe('plates of comparison', () => {
	it.each(sources)('%s is clean SVG, wide and narrow', (source) => {
		const drawing = drawPlate(specOf(source));
		expect(drawing.match(/<svg class="plate-(?:wide|narrow)"/g)).toHaveLength(2);
		expect(drawing).not.toMatch(/NaN|undefined|\[object| style=|<!--|lc-|Infinity/);
	});

	it.each(sources)('%s has its numbers as a table and as CSV', (source) => {
		const spec = specOf(source);
		expect(plateTable(spec)).toContain('<table');
		const [head = '', ...lines] = plateCsv(spec).trim().split('\r\n');
		expect(lines.length).toBeGreaterThan(1);
		expect(head.split(',').length).toBeGreaterThan(5);
	});

	it('overall prints R’s geometric means', () => {
		const spec = specOf('::plate{kind=overall}');
		const points = spec.kind === 'overall' ? (spec.rows[0]?.points ?? []) : [];
		for (const [profile, ratio] of Object.entries(reference().overall)) {
			const point = points.find((one) => one?.profile === profile);
			expect(point?.ratio).toBeCloseTo(ratio, 9);
			expect(point?.ci95).not.toBeNull();
		}
	});

	it('drift is one path a series, however many runs', () => {
		const short = drawPlate(specOf(sources[3] ?? ''));
		const [drift] = drifting.drifts;
		const long = renderArticle(
			sources[3] ?? '',
			{
				...drifting,
				drifts: drift
					? [{ ...drift, runs: [...drift.runs, ...drift.runs.map((run) => ({ ...run, run: run.run + 50 }))] }]
					: []
			},
			() => ''
		).plates[0]?.spec;
		if (!long) throw new Error('no plate');
		const paths = (drawing: string) => drawing.match(/<path /g)?.length;
		expect(paths(drawPlate(long))).toBe(paths(short));
	});

	it.each([
		['::plate{kind=value}', 'no workload with one measure of power'],
		['::plate{kind=value per=price part=brisk-9 workload=prime-search}', 'no part called “brisk-9”'],
		['::plate{kind=value per=hour}', 'hour'],
		['::plate{kind=drift rig=n-13}', 'No rig of this article is called “n-13”'],
		['::plate{kind=drift workload=tile}', 'Stock was not measured with “tile”'],
		['::plate{kind=overall over=nobody}', 'nobody']
	])('%s is an error in its place', (source, words) => {
		const { errors } = renderArticle(source, drifting, () => '');
		expect(errors).toHaveLength(1);
		expect(errors[0]?.message).toContain(words);
	});
});
