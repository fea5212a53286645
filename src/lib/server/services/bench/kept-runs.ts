import { bounded } from '../../bounded';
import type { Context } from '../../context';
import * as recorded from '../../db/queries/campaign-readings';
import * as marks from '../../db/queries/cell-marks';

interface KeptCell {
	mark: string;
	runs: recorded.RecordedRun[];
}

/** Campaigns whose runs are kept; the one looked at longest ago goes first. */
const mostCampaigns = 12;
/** A campaign with more cells to read than this is read whole: a shorter question. */
const mostCells = 200;

const keyOf = (cell: { profileId: number; workloadId: number }) => `${cell.profileId}/${cell.workloadId}`;

/** A process's own runs of the campaigns whose boards are looked at. */
export function keptRuns() {
	const cellsOf = bounded<number, Map<string, KeptCell>>(mostCampaigns);

	/**
	 * Every run of a campaign with its readings, and every standing signature, as they are stored now: only the cells
	 * that changed since the last time are read. The marks are read first, so that a cell that changes in between is
	 * read again the next time rather than kept under a mark newer than its runs.
	 */
	return async ({ db }: Pick<Context, 'db'>, campaignId: number): Promise<recorded.CampaignReadings> => {
		const kept = cellsOf(campaignId, () => new Map());
		const [found, signatures] = await Promise.all([
			marks.ofCampaign(db, campaignId),
			recorded.signaturesOf(db, [campaignId])
		]);
		const standing = new Map(found.map((cell) => [keyOf(cell), cell.mark]));
		for (const key of kept.keys()) if (!standing.has(key)) kept.delete(key);
		const cells = found.filter((cell) => kept.get(keyOf(cell))?.mark !== cell.mark);
		const fresh =
			cells.length > mostCells
				? ((await recorded.forCampaigns(db, [campaignId])).get(campaignId)?.runs ?? [])
				: await recorded.runsOfCells(db, { campaignId, cells });
		for (const cell of cells) kept.set(keyOf(cell), { mark: cell.mark, runs: [] });
		const read = new Set(cells.map(keyOf));
		for (const run of fresh) if (read.has(keyOf(run))) kept.get(keyOf(run))?.runs.push(run);
		const runs = [...kept.values()].flatMap((cell) => cell.runs).sort((a, b) => a.id - b.id);
		return { runs, signatures };
	};
}
