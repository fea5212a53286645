import type { CellFigures, WorkloadFacts } from '../../bench/figures';
import type { ArticleData, CampaignData } from '../data';
import type { UsedCell } from '../directives/shape';

/** A cell whose data the article shows, with what its names stand for. */
export interface ShownCell {
	campaign: CampaignData;
	workload: WorkloadFacts;
	figures: CellFigures;
	/** Workload and profile by their names. */
	name: string;
}

/** The measured cells an article shows, each once, in the order it shows them; cells without readings are left out. */
export function shownCells(data: ArticleData, cells: UsedCell[]): ShownCell[] {
	const seen = new Set<string>();
	return cells.flatMap((cell) => {
		const key = `${cell.campaign}/${cell.profile}/${cell.workload}`;
		if (seen.has(key)) return [];
		seen.add(key);
		const campaign = data.campaigns.find((one) => one.slug === cell.campaign);
		const workload = campaign?.workloads.find((one) => one.slug === cell.workload);
		const profile = campaign?.profiles.find((one) => one.slug === cell.profile);
		const figures = campaign?.cells.find(
			(one) => one.profile === cell.profile && one.workload === cell.workload
		);
		if (!campaign || !workload || !profile || !figures?.summary) return [];
		return [{ campaign, workload, figures, name: `${workload.name} with ${profile.name}` }];
	});
}

/** Cells by their campaign, in order. */
export function byCampaign(cells: ShownCell[]): [CampaignData, ShownCell[]][] {
	const groups = new Map<string, [CampaignData, ShownCell[]]>();
	for (const cell of cells) {
		const group = groups.get(cell.campaign.slug);
		if (group) group[1].push(cell);
		else groups.set(cell.campaign.slug, [cell.campaign, [cell]]);
	}
	return [...groups.values()];
}
