import type { Overall } from '../../bench/figures';
import { overallWords } from '../../bench/overall-words';
import { printedGain, printedGainRange } from '../../shared/quantity';
import { overallOver } from '../against';
import type { ArticleData, CampaignData, ProfileFacts } from '../data';
import { rigAndDates } from './foot';
import { seriesOf } from './series';
import type { GainPoint, OverallSpec } from './spec';

/** A geometric mean as a dot; `n` counts workloads. */
export const overallPoint = (profile: string, figure: Overall): GainPoint => ({
	profile,
	gainPercent: figure.gainPercent,
	ci95: figure.gainCi95 ?? null,
	ratio: figure.ratio,
	n: figure.workloads.length,
	nBaseline: figure.workloads.length,
	verdict: null,
	printed: printedGain(figure.gainPercent, figure.gainCi95),
	printedInterval: figure.gainCi95 ? printedGainRange(figure.gainCi95) : null
});

const stockName = (name: string): string => (name.toLowerCase() === 'stock' ? 'stock' : name);

/** The overall gain of every profile over one of them. Null where no workload was measured with both. */
export function overallSpec(
	campaign: CampaignData,
	over: ProfileFacts,
	{ zone }: Pick<ArticleData, 'zone'>,
	options: { profiles?: string[]; subject?: string; title?: string } = {}
): OverallSpec | null {
	const numbers = seriesOf(campaign, options.subject);
	const figures = campaign.profiles.flatMap((profile) => {
		const wanted = profile.slug !== over.slug && (options.profiles?.includes(profile.slug) ?? true);
		const figure = wanted ? overallOver(campaign, profile.slug, over.slug) : null;
		return figure ? [{ profile, figure }] : [];
	});
	if (figures.length === 0) return null;
	const workloads = [...new Set(figures.flatMap(({ figure }) => figure.workloads))];
	const shown = new Set([over.slug, ...figures.map(({ profile }) => profile.slug)]);
	return {
		kind: 'overall',
		campaign: campaign.slug,
		title: options.title ?? `Overall gain over ${stockName(over.name)}`,
		sub: 'Geometric mean of the ratios of performance, in percent; right is better.',
		baseline: { profile: over.slug, name: over.name },
		series: figures.map(({ profile }) => ({
			profile: profile.slug,
			name: profile.name,
			series: numbers.get(profile.slug) ?? 1
		})),
		rows: [
			{
				workload: 'overall',
				name: 'Overall',
				kind: `${workloads.length} workload${workloads.length === 1 ? '' : 's'}`,
				leastDifferencePercent: null,
				points: figures.map(({ profile, figure }) => overallPoint(profile.slug, figure))
			}
		],
		workloads,
		foot: [
			'Each workload counts once; whiskers are 95 % intervals of the geometric mean, for these workloads.',
			...overallWords(
				figures.map(({ profile, figure }) => ({ name: profile.name, figure })),
				campaign.workloads
			),
			rigAndDates(
				campaign,
				campaign.cells.filter((cell) => shown.has(cell.profile) && workloads.includes(cell.workload)),
				zone
			)
		]
	};
}
