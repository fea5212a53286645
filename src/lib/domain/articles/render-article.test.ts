import { describe, expect, it } from 'vitest';
import { measuredArticle, measuredCampaign, reference } from '../../../../tests/fixtures/article-data';
import { decimalsFor, roundedDecimal } from '../shared/quantity';
import type { ArticleData } from './data';
import { renderArticle, type Rendered } from './render-article';

const data = measuredArticle();
const render = (source: string, from: ArticleData = data): Rendered =>
	renderArticle(source, from, () => '<svg></svg>');

/** A printed figure as a plain number. */
const plainNumber = (text: string): string =>
	(/[\u2212+]?\d[\d.]*(?:\u00a0\d[\d.]*)*/.exec(text)?.[0] ?? '')
		.replace('\u2212', '-')
		.replace(/[+\u00a0]/g, '');

const named = (slug: string): string => slug.charAt(0).toUpperCase() + slug.slice(1).replace(/-/g, ' ');

// Outside check: tests/fixtures/reference.txt is what R 4.2.2 gives for readings.csv (reference.R: mean,
// median, t.test, ratio of means, exp(mean(log ratio))).
describe('figures in print are those of R', () => {
	const { cells, ratios, overall } = reference();
	it('has all of them', () => {
		expect([cells.length, ratios.length, Object.keys(overall).length]).toEqual([28, 21, 3]);
	});
	it.each(cells)('$profile $workload: mean, median and interval', (cell) => {
		const halfWidth = (cell.ci95[1] - cell.ci95[0]) / 2;
		const print = (value: number) => roundedDecimal(value, decimalsFor(cell.mean, { halfWidth }));
		const names = `workload=${cell.workload} profile=${cell.profile}`;
		const { bound, errors } = render(
			`:reading{${names}} :reading{${names} show=median} :reading{${names} show=interval}`
		);
		expect(errors).toEqual([]);
		const [mean, median, interval] = bound.map((figure) => figure.printed);
		expect(plainNumber(mean ?? '')).toBe(print(cell.mean));
		const ofMedian = roundedDecimal(cell.median, decimalsFor(cell.median, { halfWidth }));
		expect(plainNumber(median ?? '')).toBe(ofMedian);
		expect(interval?.split(' to ').map(plainNumber)).toEqual(cell.ci95.map(print));
	});
	it.each(ratios)('$profile $workload: gain', ({ profile, workload, ratio }) => {
		const names = `workload=${workload} profile=${profile}`;
		const { bound } = render(`:gain{${names} over=stock} :gain{${names} show=ratio}`);
		const gain = bound[0];
		const decimals = gain?.printed.includes('.') ? 1 : 0;
		expect(plainNumber(gain?.printed ?? '')).toBe(roundedDecimal((ratio - 1) * 100, decimals));
		expect(bound[1]?.printed).toBe(roundedDecimal(ratio, 3));
	});
	it.each(Object.entries(overall))('%s: overall', (profile, ratio) => {
		const { bound } = render(`:overall{profile=${profile} over=stock}`);
		expect(plainNumber(bound[0]?.printed ?? '')).toBe(roundedDecimal((ratio - 1) * 100, 1));
	});
	it('and so are those of the results table', () => {
		const { html } = render('::results');
		const groups = html.split('<tbody').slice(1);
		expect(groups).toHaveLength(7);
		for (const cell of cells) {
			const group = groups.find((one) => one.includes(`>${named(cell.workload)}, `)) ?? '';
			const rows = [...group.matchAll(/<tr>(<th scope="row">.*?)<\/tr>/g)].map((row) =>
				[...(row[1] ?? '').matchAll(/<t[hd][^>]*>(.*?)<\/t[hd]>/g)].map((one) => one[1] ?? '')
			);
			expect(rows).toHaveLength(4);
			const [, n, mean, , variation] = rows.find(([profile]) => profile === named(cell.profile)) ?? [];
			const halfWidth = (cell.ci95[1] - cell.ci95[0]) / 2;
			expect(n).toBe('7');
			expect(plainNumber(mean ?? '')).toBe(roundedDecimal(cell.mean, decimalsFor(cell.mean, { halfWidth })));
			expect(plainNumber(variation ?? '')).toBe(roundedDecimal(cell.cvPercent, 1));
		}
	});
});

describe('directives', () => {
	it('stand across lines of one sentence', () => {
		const { html, errors } = render('It takes :reading{workload=source-build\nprofile=stock} here.');
		expect(errors).toEqual([]);
		expect(html).toContain('data-workload="source-build"');
		expect(html).toContain('title="Source build, Stock: 7 readings, 95 % interval 3.025 to 3.141\u00a0s"');
	});

	it('name what is near when a name finds nothing', () => {
		const { errors, html, bound } = render(
			'One\n\n:reading{workload=source-biuld profile=stock} and :gain{workload=source-build profile=hugepages}'
		);
		expect(bound).toEqual([]);
		expect(errors.map(({ line, directive, nearest }) => [line, directive, nearest[0]])).toEqual([
			[3, 'reading', 'source-build'],
			[3, 'gain', 'huge-pages']
		]);
		expect(html).toContain('class="directive-error"');
		expect(html).toContain('Near: source-build');
	});

	it.each([
		['::plate{kind=frames workload=source-build}', 'It can be scores, gains,'],
		['::plate{kind=scores}', 'needs a workload'],
		['::plate', 'needs kind='],
		[':plate{kind=gains}', 'line of its own'],
		['::reading{workload=source-build profile=stock}', 'in a sentence'],
		['::caution{topic=radiation}', 'voltage, power, heat'],
		['::steps{profile=stock}', 'changes no settings'],
		['::kit{rig=n-13}', 'n-13'],
		[':gain{workload=source-build profile=stock}', 'against itself'],
		[':reading{workload=source-build}', 'needs profile='],
		[':reading{workload=source-build profile=stock shw=median}', 'no attribute'],
		['::rezults', 'no directive called'],
		[':reading{workload="a profile=b}', 'cannot be read']
	])('%s is an error in its place', (source, words) => {
		const { errors, html } = render(`Before.\n\n${source}\n\nAfter.`);
		expect(errors).toHaveLength(1);
		expect(errors[0]?.message).toContain(words);
		expect(errors[0]?.line).toBe(3);
		expect(html).toMatch(/Before[\s\S]*directive-error[\s\S]*After/);
	});

	it('say that there is no data yet', () => {
		const bare: ArticleData = { campaigns: [], duties: [], zone: 'UTC' };
		expect(render(':reading{workload=a profile=b}', bare).errors[0]?.message).toContain(
			'bound to no campaign'
		);
		const campaign = measuredCampaign();
		const first = campaign.cells[0];
		if (first) first.summary = null;
		const empty = render(
			'::plate{kind=scores workload=prime-search} :reading{workload=prime-search profile=stock}',
			{
				...bare,
				campaigns: [campaign]
			}
		);
		expect(empty.errors.map((error) => error.message).join()).toContain('no readings yet');
	});

	it('ask which campaign when names are in two', () => {
		const twice: ArticleData = {
			...data,
			campaigns: [measuredCampaign(), { ...measuredCampaign(), slug: 'again' }]
		};
		const asked = render(':reading{workload=source-build profile=stock}', twice);
		expect(asked.errors[0]?.nearest).toEqual(['two-cores', 'again']);
		const told = render(':reading{workload=source-build profile=stock campaign=again}', twice);
		expect(told.bound[0]?.campaign).toBe('again');
	});

	it('take names that begin with a digit as they are', () => {
		const campaign = measuredCampaign();
		campaign.workloads.forEach((one) => (one.slug = `7-${one.slug}`));
		campaign.cells.forEach((one) => (one.workload = `7-${one.workload}`));
		const { errors } = render(':reading{workload=7-source-build profile=stock}', {
			...data,
			campaigns: [campaign]
		});
		expect(errors).toEqual([]);
	});

	it('leave ordinary colons and code alone', () => {
		const { html, errors } = render(
			'At 12:30 std::vector :smile: \\:reading{a=b} `:reading{workload=x}` a:b{'
		);
		expect(errors).toEqual([]);
		expect(html).toContain('At 12:30 std::vector :smile: :reading{a=b} <code>:reading{workload=x}</code>');
	});

	it('hold against a profile that is not the baseline', () => {
		const ours = measuredCampaign().cells.find(
			(cell) => cell.profile === 'huge-pages' && cell.workload === 'memory-copy'
		);
		const theirs = measuredCampaign().cells.find(
			(cell) => cell.profile === 'single-core' && cell.workload === 'memory-copy'
		);
		const ratio = (ours?.summary?.mean ?? 0) / (theirs?.summary?.mean ?? 1);
		const { bound } = render(':gain{workload=memory-copy profile=huge-pages over=single-core show=ratio}');
		expect(bound[0]?.value).toBeCloseTo(ratio, 12);
	});

	it('give gains in words that follow the verdict', () => {
		const { plain } = render(
			':gain{workload=prime-search profile=single-core show=words}; :gain{workload=source-build profile=single-core show=words}; :gain{workload=stream-pack profile=huge-pages show=words}'
		);
		expect(plain).toBe('48.8\u00a0% worse; 28.0\u00a0% better; 3\u00a0% better (not enough runs to say)');
	});
});

describe('blocks', () => {
	it('sets steps in menu order, each caution beside its step', () => {
		const { html, cautions } = render('::steps{profile=huge-pages}');
		expect(html.indexOf('Tuning › Clocks')).toBeLessThan(html.indexOf('Core ratio'));
		expect(html).toMatch(/Core voltage[\s\S]*1\.24\u00a0V[\s\S]*6\.0\u00a0% over stock/);
		expect(cautions).toEqual(['voltage']);
	});
	it('lists the kit with its sum and the days of its prices', () => {
		const { html } = render('::kit{rig=n-12}');
		expect(html).toContain('$925.00');
		expect(html).toContain('Prices as seen from 3 November 2026 to 9 November 2026.');
		expect(html).toContain('One line has no price');
	});
	it('discloses what was lent and given, and says so when nothing was', () => {
		const { html, hasDisclosure } = render('::disclosure');
		expect(hasDisclosure).toBe(true);
		expect(html).toContain('Hollin lent us the processor');
		expect(html).toContain('Pennon 2 × 16 GB was given to us free of charge.');
		expect(render('::disclosure', { ...data, duties: [] }).html).toContain('we bought all of it');
	});
	it('gives each plate once, with a key that follows its figures', () => {
		const source =
			'::plate{kind=gains over=stock}\n\n::plate{kind=scores workload=source-build}\n\n::plate{kind=gains over=stock}';
		const { plates, html } = render(source);
		expect(plates.map((plate) => plate.spec.kind)).toEqual(['gains', 'scores']);
		expect(html).toContain(`href="plates/${plates[0]?.key}.csv"`);
		const moved = measuredCampaign();
		const cell = moved.cells.find((one) => one.workload === 'source-build' && one.profile === 'huge-pages');
		if (cell?.summary) cell.summary.mean += 1;
		const again = render(source, { ...data, campaigns: [moved] });
		expect(again.plates[1]?.key).not.toBe(plates[1]?.key);
		expect(render(source).plates.map((plate) => plate.key)).toEqual(plates.map((plate) => plate.key));
	});
	it('puts a note in the margin, directives in it included', () => {
		const { html, errors } = render(
			':::note{title="How sure are we?"}\nSeven runs, :reading{workload=source-build profile=stock}.\n:::\n\nAfter.'
		);
		expect(errors).toEqual([]);
		expect(html).toMatch(
			/<aside class="margin-note"[^>]*><p class="margin-note-title">How sure are we\?<\/p><p[^>]*>Seven runs, <span class="reading"/
		);
	});
	it('knows what is used', () => {
		const { uses } = render(':gain{workload=source-build profile=huge-pages}');
		expect(uses).toEqual({
			campaigns: ['two-cores'],
			profiles: [
				{ campaign: 'two-cores', profile: 'huge-pages' },
				{ campaign: 'two-cores', profile: 'stock' }
			],
			cells: [
				{ campaign: 'two-cores', workload: 'source-build', profile: 'huge-pages' },
				{ campaign: 'two-cores', workload: 'source-build', profile: 'stock' }
			],
			terms: []
		});
	});
});
