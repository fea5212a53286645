import { cellsOff, driftFacts, rigOff, type CellOff } from '../../../domain/bench/drift-facts';
import type { Context } from '../../context';
import * as stock from '../../db/queries/stock-runs';
import type { MeasuredCampaign } from './read-campaign';

/** The cells of a campaign that were measured while its rig was off: two queries, however many there are. */
export async function campaignOff(
	ctx: Pick<Context, 'db'>,
	{ plan, matrix }: Pick<MeasuredCampaign, 'plan' | 'matrix'>
): Promise<CellOff[]> {
	const runs = await stock.ofRigs(ctx.db, { rigs: [plan.head.rigId] });
	return cellsOff(matrix.runs, rigOff(driftFacts(runs), plan.head.revision));
}
