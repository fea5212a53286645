import type { Context } from '../../context';
import * as audit from '../../db/queries/audit';
import * as signatures from '../../db/queries/cell-signature';

export interface NamedCell extends signatures.Cell {
	/** profile/workload, by slug. */
	name: string;
}

/** Takes the standing signature off a cell whose data changed, and says so in the history; false where there was none. */
export async function takeSignatureOff(ctx: Context, cell: NamedCell, reason: string): Promise<boolean> {
	const written = reason.slice(0, 300);
	if (!(await signatures.takeOff(ctx.db, cell, ctx.now, written))) return false;
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'cell.unsign',
			subjectKind: 'campaign',
			subjectId: cell.campaignId,
			before: { cell: cell.name, signed: true },
			after: { cell: cell.name, signed: false },
			reason: written
		}
	]);
	return true;
}
