import { describe, expect, it } from 'vitest';
import { measuredArticle, measuredCampaign, reference } from '../../../../../tests/fixtures/article-data';
import { verdictWords, verdicts } from '../../bench/figures';
import { verdictCounts } from '../../bench/verdict-counts';
import { roundedDecimal } from '../../shared/quantity';
import { renderArticle } from '../render-article';

const data = measuredArticle();
const render = (source: string, from = data) => renderArticle(source, from, () => '<svg></svg>');
const text = (html: string) => html.replace(/<[^>]+>/g, '|').replaceAll('\u00a0', ' ');

describe('what several verdicts say together', () => {
	it('counts them, and says it once where they agree', () => {
		expect(verdictCounts([])).toBe('nothing to compare');
		expect(verdictCounts([null, 'better'])).toBe('better');
		expect(verdictCounts(['worse', 'worse'])).toBe('worse in all 2');
		expect(verdictCounts(['no-difference', 'better', 'better', null])).toBe(
			'better in 2 of 3, no difference that matters in 1'
		);
	});
});

describe('the verdict box', () => {
	const source =
		':::verdict{profile=huge-pages over=stock for="those who copy memory all day" not="a quiet room"}\nWorth it, :gain{workload=memory-copy profile=huge-pages}.\n:::';

	it('says what the data say, then the writer’s words, then for whom', () => {
		const { html, errors, uses } = render(source);
		expect(errors).toEqual([]);
		const words = text(html);
		expect(words).toMatch(
			/Overall.*Worth it.*Good for.*those who copy memory all day.*Not for.*a quiet room/s
		);
		// Outside check: the overall ratio is R's exp(mean(log(ratio))) in tests/fixtures/reference.txt.
		const gain = roundedDecimal(((reference().overall['huge-pages'] ?? 0) - 1) * 100, 1).replace('-', '');
		expect(words).toMatch(new RegExp(`Overall\\|+[+−]${gain.replace('.', '\\.')} %`));
		expect(uses.profiles).toContainEqual({ campaign: 'two-cores', profile: 'huge-pages' });
		expect(uses.cells).toHaveLength(14);
	});

	it('counts the verdicts as the table of results has them', () => {
		const { cells } = measuredCampaign();
		const of = cells
			.filter((cell) => cell.profile === 'huge-pages')
			.map((cell) => cell.comparison?.verdict ?? null);
		const { html } = render(source);
		for (const verdict of verdicts) {
			const n = of.filter((one) => one === verdict).length;
			if (n > 0) expect(text(html)).toContain(`${verdictWords[verdict]} in ${n}`);
		}
		expect(text(html)).toContain(verdictCounts(of));
	});

	it('holds against another profile than the baseline', () => {
		const { html, errors } = render(':::verdict{profile=huge-pages over=single-core}\nSo.\n:::');
		expect(errors).toEqual([]);
		expect(html).toContain('Against Single core');
	});

	it('is spoken with what it is held against', () => {
		expect(render(source).plain).toContain('Good for: those who copy memory all day');
	});
});

describe('the trade-off table', () => {
	it('has every profile under each thing it is weighed by', () => {
		const { html, errors } = render('::tradeoffs');
		expect(errors).toEqual([]);
		const groups = html.split('class="row-group"').slice(1);
		expect(groups.length).toBeGreaterThan(1);
		for (const group of groups) expect(group.match(/<th scope="row">/g)).toHaveLength(3);
		expect(text(groups[0] ?? '')).toContain('Overall');
	});
	it('can be of some profiles alone', () => {
		const { html } = render('::tradeoffs{profiles=huge-pages}');
		expect(html).not.toContain('>Single core<');
		expect(render('::tradeoffs{profiles=hugepages}').errors[0]?.nearest).toContain('huge-pages');
	});
});

describe('what we tested', () => {
	it('says with what, how often, when and by whom', () => {
		const { html, errors, uses } = render('::tested');
		expect(errors).toEqual([]);
		const words = text(html);
		expect(words).toMatch(/Rig\|.*Samples\|.*Repeats\|.*n = 7 each.*Days\|/s);
		expect(uses.campaigns).toEqual(['two-cores']);
	});
	it('counts samples of one part that came the same way', () => {
		const campaign = measuredCampaign();
		const line = campaign.kit[0];
		if (!line) throw new Error('The fixture has no kit.');
		campaign.kit = [line, { ...line, sample: 'another' }];
		campaign.cells.forEach((cell) => (cell.testers = ['Ada Stern']));
		const { html } = render('::tested', { ...data, campaigns: [campaign] });
		expect(text(html)).toContain(`2 × ${line.partName}`);
		expect(text(html)).toContain('Tester||Ada Stern');
	});
});
