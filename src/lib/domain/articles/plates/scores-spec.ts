import type { WorkloadFacts } from '../../bench/figures';
import { printedAverage, printedInterval } from '../figures-in-words';
import type { ArticleData, CampaignData } from '../data';
import { figuresOf } from '../directives/lookup';
import { countsInWords, rigAndDates } from './foot';
import { seriesOf } from './series';
import type { ScoreRow, ScoresSpec } from './spec';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/**
 * The bars of one workload: every measured profile of the campaign, best first, by the average its protocol
 * puts in print. Null where nothing was measured.
 */
export function scoresSpec(
	campaign: CampaignData,
	workload: WorkloadFacts,
	{ zone }: Pick<ArticleData, 'zone'>,
	options: { profiles?: string[]; subject?: string; title?: string } = {}
): ScoresSpec | null {
	const series = seriesOf(campaign, options.subject);
	const shown = campaign.profiles.filter((one) => options.profiles?.includes(one.slug) ?? true);
	const cells = shown.flatMap((profile) => {
		const cell = figuresOf(campaign, profile.slug, workload.slug);
		return cell?.summary ? [{ profile, cell, summary: cell.summary }] : [];
	});
	if (cells.length === 0) return null;
	const rows = cells
		.map(({ profile, summary }): ScoreRow => ({
			profile: profile.slug,
			name: profile.name,
			series: series.get(profile.slug) ?? 1,
			value: summary.headline,
			ci95: summary.ci95,
			mean: summary.mean,
			median: summary.median,
			sd: summary.sd,
			n: summary.n,
			printed: printedAverage(summary, workload),
			printedInterval: printedInterval(summary, workload)
		}))
		.sort((a, b) => (workload.better === 'higher' ? b.value - a.value : a.value - b.value));
	const bars = workload.better === 'higher' ? 'longer is better' : 'shorter is better';
	const version = workload.programVersion ? `, ${workload.programVersion}` : '';
	return {
		kind: 'scores',
		campaign: campaign.slug,
		workload: workload.slug,
		title: options.title ?? workload.name,
		sub: `${capital(workload.quantity)} in ${workload.unit}; ${bars}.`,
		unit: workload.unit,
		better: workload.better,
		rows,
		foot: [
			`${workload.name}${version}: ${workload.headline} of ${countsInWords(rows.map((row) => row.n))}; whiskers are 95 % intervals of the mean.`,
			rigAndDates(
				campaign,
				cells.map(({ cell }) => cell),
				zone
			)
		]
	};
}
