import { readFileSync } from 'node:fs';
import { describe, expect, it, vi } from 'vitest';
import { measuredArticle, measuredCampaign } from '../../../../tests/fixtures/article-data';
import type { GainsSpec, PlateSpec, ScoresSpec } from '../../domain/articles/plates/spec';
import { renderArticle } from '../../domain/articles/render-article';
import { drawPlate } from './draw-plate';
import { inks, standaloneSvg } from './standalone-svg';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

function specOf(source: string): PlateSpec {
	const spec = renderArticle(source, measuredArticle(), () => '').plates[0]?.spec;
	if (!spec) throw new Error('There is no plate.');
	return spec;
}
const gains = specOf('::plate{kind=gains}') as GainsSpec;
const scores = specOf('::plate{kind=scores workload=source-build}') as ScoresSpec;

const numbersIn = (markup: string): number[] =>
	[...markup.matchAll(/ (?:d|x|y|width|height|x1|x2)="([^"]*)"/g)].flatMap((match) =>
		(match[1] ?? '')
			.split(/[^\d.eE+-]+/)
			.filter((part) => part !== '')
			.map(Number)
	);

describe('plates', () => {
	it.each([['gains', gains] as const, ['scores', scores] as const])(
		'%s are clean SVG, wide and narrow',
		(_, spec) => {
			const drawing = drawPlate(spec);
			expect(drawing.match(/<svg class="plate-(?:wide|narrow)"/g)).toHaveLength(2);
			expect(drawing).not.toMatch(/NaN|undefined|\[object| style=|<!--|lc-|Infinity/);
			expect(drawing).toMatch(/^<svg[^>]* role="img"[^>]*><title>/);
		}
	);

	it('bars stand in proportion to what was measured', () => {
		const widths = [...drawPlate(scores).matchAll(/<rect [^>]*width="([\d.]+)"/g)]
			.slice(0, scores.rows.length)
			.map((match) => Number(match[1]));
		const [first = 0, ...rest] = widths;
		rest.forEach((width, index) => {
			expect(width / first).toBeCloseTo(
				(scores.rows[index + 1]?.value ?? 0) / (scores.rows[0]?.value ?? 1),
				2
			);
		});
	});

	it('bars come best first, whichever way is better', () => {
		expect(scores.better).toBe('lower');
		expect(scores.rows.map((row) => row.value)).toEqual(
			scores.rows.map((row) => row.value).sort((a, b) => a - b)
		);
		const higher = specOf('::plate{kind=scores workload=prime-search}') as ScoresSpec;
		expect(higher.rows.map((row) => row.value)).toEqual(
			higher.rows.map((row) => row.value).sort((a, b) => b - a)
		);
		expect([scores.sub, higher.sub]).toEqual([
			'Time in s; shorter is better.',
			'Rate in events/s; longer is better.'
		]);
	});

	it('one series is one path of whiskers and one of marks', () => {
		const [wide = ''] = drawPlate(gains).split('</svg>');
		const blue = wide.match(/<path [^>]*stroke="var\(--color-blue\)"[^>]*>/g) ?? [];
		// Whiskers, marks, and its mark in the key.
		expect(blue).toHaveLength(3);
	});

	it('draw what is at the edges', () => {
		const row = scores.rows[0];
		const gain = gains.rows[0];
		if (!row || !gain) throw new Error('There are no rows.');
		const edges: PlateSpec[] = [
			{ ...scores, rows: [{ ...row, ci95: null, printedInterval: null, value: 0, n: 1 }] },
			{ ...scores, rows: [{ ...row, value: 1e-9, ci95: [1e-10, 2e-9] }] },
			{
				...scores,
				rows: [
					{
						...row,
						value: 3.4e12,
						ci95: [-1e12, 9e12],
						name: 'x'.repeat(160),
						printed: '3\u00a0400\u00a0000\u00a0000\u00a0000 bytes/s'
					}
				]
			},
			{ ...gains, rows: [{ ...gain, points: [null, null, gain.points[2] ?? null] }] },
			{
				...gains,
				series: Array.from({ length: 12 }, (_, index) => ({
					profile: `p-${index}`,
					name: `Profile number ${index}`,
					series: index + 1
				})),
				rows: [
					{
						...gain,
						points: Array.from({ length: 12 }, (_, index) => ({
							...(gain.points[0] ?? gains.rows[1]?.points[0]),
							gainPercent: index * 90 - 99
						})) as GainsSpec['rows'][number]['points']
					}
				]
			}
		];
		for (const spec of edges) {
			const drawing = drawPlate(spec);
			expect(drawing).not.toMatch(/NaN|Infinity|undefined/);
			expect(numbersIn(drawing).every((number) => Number.isFinite(number) && Math.abs(number) < 5000)).toBe(
				true
			);
		}
	});

	it('an empty campaign gives no plate but an error', () => {
		const campaign = measuredCampaign();
		campaign.cells.forEach((cell) => {
			cell.summary = null;
			cell.comparison = null;
		});
		const { plates, errors } = renderArticle(
			'::plate{kind=gains}',
			{ ...measuredArticle(), campaigns: [campaign] },
			drawPlate
		);
		expect(plates).toEqual([]);
		expect(errors).toHaveLength(1);
	});
});

describe('a plate as a file', () => {
	const file = standaloneSvg(drawPlate(scores));
	it('is one drawing with its colours in it', () => {
		expect(file).toMatch(
			/^<\?xml version="1\.0" encoding="UTF-8"\?>\n<svg class="plate-wide" xmlns="http:\/\/www\.w3\.org\/2000\/svg"[^>]*><style>/
		);
		expect(file.match(/<svg/g)).toHaveLength(1);
		const used = new Set([...file.matchAll(/var\(--color-([a-z-]+)\)/g)].map((match) => match[1] ?? ''));
		expect([...used].filter((name) => !(name in inks))).toEqual([]);
	});
	it('has the colours of the site', () => {
		const tokens = readFileSync('src/lib/components/styles/tokens.css', 'utf8');
		for (const [name, [light, dark]] of Object.entries(inks)) {
			expect(tokens).toContain(`--color-${name}: light-dark(${light}, ${dark});`);
		}
	});
});
