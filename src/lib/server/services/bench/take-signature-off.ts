import type { Context } from '../../context';
import * as audit from '../../db/queries/audit';
import * as signatures from '../../db/queries/cell-signature';

export interface NamedCell extends signatures.Cell {
	/** profile/workload, by slug. */
	name: string;
}

/**
 * Takes the standing signatures off cells whose data changed, and says so in the history. Returns how many there were.
 * The cells are locked by the caller.
 */
export async function takeSignaturesOff(
	ctx: Context,
	cells: readonly NamedCell[],
	reason: string
): Promise<number> {
	if (cells.length === 0) return 0;
	const standing = await signatures.standingOf(ctx.db, cells);
	const signed = standing.flatMap((row) => {
		const cell = cells.find((one) => one.profileId === row.profileId && one.workloadId === row.workloadId);
		return cell ? [{ id: row.id, cell }] : [];
	});
	const written = reason.slice(0, 300);
	await signatures.takeOff(
		ctx.db,
		signed.map((row) => row.id),
		ctx.now,
		written
	);
	await audit.append(
		ctx.db,
		signed.map(({ cell }) => ({
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'cell.unsign',
			subjectKind: 'campaign',
			subjectId: cell.campaignId,
			before: { cell: cell.name, signed: true },
			after: { cell: cell.name, signed: false },
			reason: written
		}))
	);
	return signed.length;
}

/** As takeSignaturesOff, of one cell; false where there was none. */
export const takeSignatureOff = async (ctx: Context, cell: NamedCell, reason: string): Promise<boolean> =>
	(await takeSignaturesOff(ctx, [cell], reason)) > 0;
