import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as planned from '../../db/queries/planned-cell';
import { findOpenCampaign } from './find-campaign';
import { findCell } from './find-cell';

interface OpenCell {
	campaignId: number;
	profile: { id: number; slug: string };
	workload: { id: number; slug: string; unit: string; needed: number };
}

/**
 * A cell of a campaign that is not archived. The usual case is one small question, as readings come one by one; whatever
 * is amiss is told by the whole plan, with the names it has.
 */
export async function findOpenCell(
	ctx: Context,
	campaignRef: string,
	refs: { profile: string; workload: string }
): Promise<Outcome<OpenCell, 'not_found' | 'conflict' | 'invalid'>> {
	const row = await planned.bySlugs(ctx.db, campaignRef, refs);
	// The database takes Stock for stock; the plan does not.
	if (row && !row.archivedAt && row.profile.slug === refs.profile && row.workload.slug === refs.workload)
		return done(row);
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const cell = findCell(found.value, refs);
	return cell.ok ? done({ campaignId: found.value.head.id, ...cell.value }) : cell;
}
