import type { CellFigures } from '../../bench/figures';
import type { CampaignData } from '../data';
import { printedDates } from '../dates';

/** How many readings a set of figures rests on. @example countsInWords([7, 7, 5]) === 'n = 5 to 7 each' */
export function countsInWords(counts: number[]): string {
	const least = Math.min(...counts);
	const most = Math.max(...counts);
	if (counts.length === 0) return 'no readings';
	if (counts.length === 1) return `n = ${most}`;
	return least === most ? `n = ${most} each` : `n = ${least} to ${most} each`;
}

/** Where and when it was measured: the rig as it stood and the days of the runs. */
export function rigAndDates(campaign: CampaignData, cells: readonly CellFigures[], zone: string): string {
	const { rig } = campaign;
	const dates = printedDates(
		cells.flatMap((cell) => [cell.from, cell.to].filter((at): at is string => at !== null)),
		zone
	);
	return `Rig ${rig.name}, revision ${rig.revision}${dates ? `, ${dates}` : ''}.`;
}
