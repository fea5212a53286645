import type { Comparison, Overall, WorkloadFacts } from '../bench/figures';
import { heldAgainst, overallAgainst } from '../bench/held-against';
import type { CampaignData } from './data';

type HeldCells = CampaignData['cells'];

/** Tables over other profiles than the baseline, so that a page of many gains computes each once. */
const tables = new WeakMap<CampaignData, Map<string, HeldCells>>();

/** A campaign's cells, each held against the same workload of a profile. */
export function cellsOver(campaign: CampaignData, over: string): HeldCells {
	if (over === campaign.baseline) return campaign.cells;
	const known = tables.get(campaign) ?? new Map<string, HeldCells>();
	tables.set(campaign, known);
	const before = known.get(over);
	if (before) return before;
	const standings = heldAgainst(campaign.cells, campaign.workloads, over);
	const cells = campaign.cells.map((cell, at) => ({
		...cell,
		comparison: standings[at]?.comparison ?? null,
		difference: standings[at]?.difference ?? null
	}));
	known.set(over, cells);
	return cells;
}

/** A cell against the same workload of another profile; null where a side has no readings or a ratio says nothing. */
export function comparisonOver(
	campaign: CampaignData,
	workload: WorkloadFacts,
	profile: string,
	over: string
): Comparison | null {
	if (profile === over) return null;
	const cell = cellsOver(campaign, over).find(
		(one) => one.profile === profile && one.workload === workload.slug
	);
	return cell?.comparison ?? null;
}

/** The geometric mean of a profile's ratios over another, with its interval; null where no workload has both. */
export function overallOver(campaign: CampaignData, profile: string, over: string): Overall | null {
	if (over === campaign.baseline) return campaign.overall[profile] ?? null;
	return overallAgainst(cellsOver(campaign, over), campaign.workloads, profile, over);
}
