import { compareSummaries } from '../bench/statistics/compare';
import { overall } from '../bench/statistics/overall';
import type { Comparison, Overall, WorkloadFacts } from '../bench/figures';
import type { CampaignData } from './data';
import { figuresOf } from './directives/lookup';

/** A cell against the same workload of another profile; null where a side has no readings or no mean above zero. */
export function comparisonOver(
	campaign: CampaignData,
	workload: WorkloadFacts,
	profile: string,
	over: string
): Comparison | null {
	if (profile === over) return null;
	const cell = figuresOf(campaign, profile, workload.slug);
	if (over === campaign.baseline) return cell?.comparison ?? null;
	const ours = cell?.summary;
	const theirs = figuresOf(campaign, over, workload.slug)?.summary;
	if (!ours || !theirs || !(ours.mean > 0 && theirs.mean > 0)) return null;
	return compareSummaries(ours, theirs, workload.better, workload.leastDifferencePercent);
}

/** The geometric mean of a profile's ratios over another; null where no workload has both. */
export function overallOver(campaign: CampaignData, profile: string, over: string): Overall | null {
	if (over === campaign.baseline) return campaign.overall[profile] ?? null;
	return overall(
		campaign.workloads.map((workload) => ({
			workload: workload.slug,
			comparison: comparisonOver(campaign, workload, profile, over)
		}))
	);
}
