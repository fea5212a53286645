import { printedPercent } from '../../shared/quantity';
import { listed, type Check } from './finding';
import { byCampaign, shownCells, type ShownCell } from './used-cells';

/** Half the 95 % interval of the mean, in percent of the mean; null where there is none. */
function halfWidthPercent({ figures }: ShownCell): number | null {
	const { summary } = figures;
	if (!summary?.ci95 || summary.mean === 0) return null;
	return (Math.abs(summary.ci95[1] - summary.ci95[0]) / 2 / Math.abs(summary.mean)) * 100;
}

/** Intervals are narrower than the least difference that matters; wider ones cannot tell it. */
export const wideIntervals: Check = ({ data, page }) =>
	byCampaign(
		shownCells(data, page.uses.cells).filter(
			(cell) => (halfWidthPercent(cell) ?? 0) > cell.workload.leastDifferencePercent
		)
	).map(([campaign, cells]) => ({
		check: 'wide-intervals',
		severity: 'advice',
		message: `${campaign.name}: the interval of ${listed(cells.map((cell) => `${cell.name} (± ${printedPercent(halfWidthPercent(cell) ?? 0)})`))} is wider than the difference that matters.`,
		mend: 'More runs make it narrower; until then the text should not make much of small differences.',
		place: { kind: 'campaign', campaign: campaign.slug }
	}));
