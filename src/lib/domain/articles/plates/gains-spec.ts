import type { Summary, WorkloadFacts } from '../../bench/figures';
import { printedGain, printedGainRange } from '../../shared/quantity';
import { comparisonOver } from '../against';
import type { ArticleData, CampaignData, ProfileFacts } from '../data';
import { figuresOf } from '../directives/lookup';
import { countsInWords, rigAndDates } from './foot';
import { seriesOf } from './series';
import type { GainPoint, GainsRow, GainsSpec } from './spec';

function pointOf(
	campaign: CampaignData,
	workload: WorkloadFacts,
	profile: string,
	over: string
): GainPoint | null {
	const comparison = comparisonOver(campaign, workload, profile, over);
	const count = (slug: string): Summary | null | undefined =>
		figuresOf(campaign, slug, workload.slug)?.summary;
	if (!comparison) return null;
	return {
		profile,
		gainPercent: comparison.gainPercent,
		ci95: comparison.gainCi95,
		ratio: comparison.ratio,
		n: count(profile)?.n ?? 0,
		nBaseline: count(over)?.n ?? 0,
		verdict: comparison.verdict,
		printed: printedGain(comparison.gainPercent, comparison.gainCi95),
		printedInterval: comparison.gainCi95 && printedGainRange(comparison.gainCi95)
	};
}

/**
 * The dots of a campaign: the gain of each profile over one of them, workload by workload. Null where no
 * workload was measured with both.
 */
export function gainsSpec(
	campaign: CampaignData,
	over: ProfileFacts,
	{ zone }: Pick<ArticleData, 'zone'>,
	options: { profiles?: string[]; subject?: string; title?: string } = {}
): GainsSpec | null {
	const numbers = seriesOf(campaign, options.subject);
	const wanted = campaign.profiles.filter(
		(one) => one.slug !== over.slug && (options.profiles?.includes(one.slug) ?? true)
	);
	const rowsOf = (profiles: ProfileFacts[]): GainsRow[] =>
		campaign.workloads
			.map((workload) => ({
				workload: workload.slug,
				name: workload.name,
				kind: workload.class,
				leastDifferencePercent: workload.leastDifferencePercent,
				points: profiles.map((profile) => pointOf(campaign, workload, profile.slug, over.slug))
			}))
			.filter((row) => row.points.some((point) => point !== null));
	const profiles = wanted.filter((profile) =>
		rowsOf([profile]).some((row) => row.points.some((point) => point !== null))
	);
	const rows = rowsOf(profiles);
	if (rows.length === 0) return null;
	const points = rows.flatMap((row) => row.points.filter((point) => point !== null));
	const shown = new Set([over.slug, ...profiles.map((profile) => profile.slug)]);
	const measured = new Set(rows.map((row) => row.workload));
	return {
		kind: 'gains',
		campaign: campaign.slug,
		title: options.title ?? `Gain over ${over.name.toLowerCase() === 'stock' ? 'stock' : over.name}`,
		sub: 'Percent; right is better. Shaded: no difference that matters.',
		baseline: { profile: over.slug, name: over.name },
		series: profiles.map((profile) => ({
			profile: profile.slug,
			name: profile.name,
			series: numbers.get(profile.slug) ?? 1
		})),
		rows,
		foot: [
			`${countsInWords(points.flatMap((point) => [point.n, point.nBaseline]))}; whiskers are 95 % intervals of the ratio of means.`,
			rigAndDates(
				campaign,
				campaign.cells.filter((cell) => shown.has(cell.profile) && measured.has(cell.workload)),
				zone
			)
		]
	};
}
