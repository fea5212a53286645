import { JSDOM } from 'jsdom';
import { describe, expect, it, vi } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { sanitisePage } from '../../../server/rendering/sanitise-page';
import { pageTree } from '../../../server/rendering/page-tree';
import type { ArticleData } from '../data';
import { renderArticle } from '../render-article';
import { comparePages, type ComparedBlock } from './compare-pages';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

const page = (source: string, data: ArticleData = measuredArticle()) =>
	pageTree(sanitisePage(renderArticle(source, data, () => '<svg></svg>').html));
const compared = (before: string, after: string, was?: ArticleData, is?: ArticleData) =>
	comparePages(page(before, was), page(after, is));
const changes = (blocks: ComparedBlock[]) => blocks.filter(({ state }) => state !== 'same');
const inside = ({ html }: ComparedBlock) => {
	const { body } = new JSDOM(html).window.document;
	const texts = (tag: string) => [...body.querySelectorAll(tag)].map((one) => one.textContent);
	return { added: texts('ins'), removed: texts('del'), body };
};

describe('two pages', () => {
	it('that are the same have no change', () => {
		const source = '## One\n\nWords *here*.\n\n| a | b |\n| - | - |\n| 1 | 2 |\n\n::plate{kind=gains}\n';
		expect(changes(compared(source, source))).toEqual([]);
		// Lines that moved down the source read the same.
		expect(changes(compared(source, `\n\n\n${source}`))).toEqual([]);
	});

	it('are compared word by word inside a paragraph, its marks kept', () => {
		const [only, ...more] = changes(
			compared(
				'First.\n\nThe fan is *very* loud at full speed.\n\nLast.',
				'First.\n\nThe fan is *rather* quiet at full speed.\n\nLast.'
			)
		);
		expect(more).toEqual([]);
		if (!only) throw new Error('no change');
		expect(only.html).toBe(
			'<p data-line="3">The fan is <em><del>very</del></em><del> loud</del><em><ins>rather</ins></em><ins> quiet</ins> at full speed.</p>'
		);
	});

	it('keep what stands in one mark together where all of it is new', () => {
		const { body } = inside(
			changes(compared('Same.', 'Same.\n\n::steps{profile=huge-pages}')).at(-1) ??
				({ html: '' } as ComparedBlock)
		);
		for (const item of body.querySelectorAll('.steps li'))
			expect(item.querySelectorAll(':scope > .step-value').length).toBeLessThanOrEqual(1);
		expect(body.textContent).toContain('stock 1.17\u00a0V1.24\u00a0V');
	});

	it('show a paragraph that moved out of the middle as taken away, and leave its neighbours alone', () => {
		const blocks = compared('One stays.\n\nTwo goes away.\n\nThree stays.', 'One stays.\n\nThree stays.');
		expect(blocks.map(({ state }) => state)).toEqual(['same', 'removed', 'same']);
	});

	it('are compared inside list items', () => {
		const [list] = changes(
			compared('- set the multiplier\n- save and leave\n- run it', '- set the multiplier to 50\n- run it')
		);
		if (!list) throw new Error('no change');
		expect(inside(list)).toMatchObject({ added: [' to 50'], removed: ['save and leave'] });
		expect(inside(list).body.querySelectorAll('li')).toHaveLength(3);
	});

	it('are compared inside table cells, rows by name, columns by head', () => {
		const before =
			'| Cooler | Noise | Price |\n| - | -: | -: |\n| Brisk | 31.2 dB | 59 |\n| Pennon | 29.0 dB | 84 |';
		const after =
			'| Cooler | Noise | Mass | Price |\n| - | -: | -: | -: |\n| Brisk | 31.9 dB | 940 g | 59 |\n| Quill | 27.5 dB | 1 kg | 99 |';
		const [table, ...more] = changes(compared(before, after));
		if (!table) throw new Error('no change');
		expect(more).toEqual([]);
		const { body } = inside(table);
		const cell = (row: string, column: number) =>
			[...body.querySelectorAll('tr')].find((one) => one.textContent?.startsWith(row))?.children[column]
				?.innerHTML;
		expect(cell('Brisk', 1)).toBe('<del>31.2</del><ins>31.9</ins> dB');
		expect(cell('Brisk', 2)).toBe('<ins>940 g</ins>');
		expect(cell('Brisk', 3)).toBe('59');
		expect(cell('Pennon', 1)).toBe('<del>29.0 dB</del>');
		expect(cell('Quill', 3)).toBe('<ins>99</ins>');
		expect(cell('Cooler', 2)).toBe('<ins>Mass</ins>');
	});

	it('compare a number of the bench whole, not its figures one by one', () => {
		const [only] = changes(
			compared(
				'It takes :reading{workload=source-build profile=stock}.',
				'It takes :reading{workload=source-build profile=single-core}.'
			)
		);
		if (!only) throw new Error('no change');
		const { added, removed } = inside(only);
		expect([added.length, removed.length]).toEqual([1, 1]);
		expect(removed[0]).toContain('3.083');
	});

	it('say which figures of a plate moved from what to what', () => {
		const was = measuredArticle();
		const is = structuredClone(was);
		const cell = is.campaigns[0]?.cells.find(
			(one) => one.workload === 'source-build' && one.profile === 'stock'
		);
		if (!cell?.summary) throw new Error('no cell');
		Object.assign(cell.summary, { mean: 9.5, median: 9.5, headline: 9.5 });
		const source = '::plate{kind=scores workload=source-build}';
		const [plate, ...more] = changes(compared(source, source, was, is));
		if (!plate) throw new Error('no change');
		expect(more).toEqual([]);
		const moved = [
			...(inside(plate)
				.body.querySelector('[aria-label="Figures that moved"]')
				?.querySelectorAll('tbody tr') ?? [])
		];
		expect(moved.map((row) => [...row.children].map((one) => one.textContent))).toContainEqual([
			'Stock',
			'Value, s',
			expect.stringContaining('3.08'),
			expect.stringContaining('9.5')
		]);
	});

	it('name the rows that a plate lost or gained, rather than each of their figures', () => {
		const all = '::plate{kind=scores workload=source-build}';
		const [plate] = changes(compared(all, '::plate{kind=scores workload=source-build profiles=single-core}'));
		if (!plate) throw new Error('no change');
		const { body, removed } = inside(plate);
		expect(removed.join(' ')).toContain('Stock');
		expect(body.querySelector('[aria-label="Figures that moved"]')).toBeNull();
	});

	it('compare pictures by their hash, and say what became of their text', () => {
		const known = (hash: string) => ({ sha256: hash, width: 100, height: 80, fallback: 'jpg' as const });
		const [a, b] = ['a'.repeat(64), 'b'.repeat(64)];
		const data = { ...measuredArticle(), pictures: [known(a), known(b)] };
		const [other] = changes(
			compared(
				`![A fan](/pictures/${a}.webp "Seen from above")`,
				`![A fan](/pictures/${b}.webp "Seen from above")`,
				data,
				data
			)
		);
		if (!other) throw new Error('no change');
		const { body } = inside(other);
		expect(body.querySelector('del img')?.getAttribute('src')).toContain(a);
		expect(body.querySelector('ins img')?.getAttribute('src')).toContain(b);
		const [words] = changes(
			compared(`![A fan](/pictures/${a}.webp "x")`, `![The fan](/pictures/${a}.webp "x")`, data, data)
		);
		expect(words && inside(words)).toMatchObject({ added: ['The'], removed: ['A'] });
	});

	it('let nothing through that is no page: what is in the text stays text', () => {
		const [only] = changes(
			compared('A <b>x</b> &amp; more words here', 'A <script>1</script> &amp; more words here')
		);
		expect(only?.html).not.toContain('<script');
	});

	it('that have nothing in common are two pages', () => {
		const blocks = compared('Alpha beta gamma.', 'Completely different words stand here now.');
		expect(blocks.map(({ state }) => state)).toEqual(['removed', 'added']);
	});
});
