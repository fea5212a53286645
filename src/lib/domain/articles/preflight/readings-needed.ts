import { listed, type Check } from './finding';
import { byCampaign, shownCells } from './used-cells';

/** Cells that the article shows hold the readings their plan asks for. */
export const readingsNeeded: Check = ({ data, page }) =>
	byCampaign(
		shownCells(data, page.uses.cells).filter(({ figures }) => (figures.summary?.n ?? 0) < figures.needed)
	).map(([campaign, cells]) => ({
		check: 'readings-needed',
		severity: 'advice',
		message: `${campaign.name}: ${listed(cells.map(({ name, figures }) => `${name} (${figures.summary?.n ?? 0} of ${figures.needed})`))} ${cells.length === 1 ? 'has' : 'have'} fewer readings than the plan asks for.`,
		mend: 'Measure the rest, or say in the text that the figure rests on few runs.',
		place: { kind: 'campaign', campaign: campaign.slug }
	}));
