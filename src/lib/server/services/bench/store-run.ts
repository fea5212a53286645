import type { RunSource } from '../../../domain/bench/words';
import type { Context } from '../../context';
import * as audit from '../../db/queries/audit';
import * as readings from '../../db/queries/reading';
import * as runs from '../../db/queries/run';
import { takeSignatureOff, type NamedCell } from './take-signature-off';

export interface NewRun {
	cell: NamedCell;
	source: RunSource;
	clientKey: string | null;
	startedAt: Date;
	ambientC: number | null;
	notes: string;
}

export interface NewReading {
	value: number;
	key: string | null;
}

/** Writes a run's own row; its cell is locked by the caller. */
export const storeRun = (ctx: Context, { cell, ...row }: NewRun): Promise<number> =>
	runs.insert(ctx.db, {
		...row,
		campaignId: cell.campaignId,
		profileId: cell.profileId,
		workloadId: cell.workloadId,
		testerId: ctx.actor.id,
		createdAt: ctx.now
	});

/**
 * Appends readings to a run from a position on, with their entry in the history; a standing signature falls.
 * Returns whether it did.
 */
export async function storeReadings(
	ctx: Context,
	cell: NamedCell,
	runId: number,
	fresh: NewReading[],
	from: number
): Promise<boolean> {
	if (fresh.length === 0) return false;
	await readings.insertMany(
		ctx.db,
		fresh.map(({ value, key }, at) => ({
			runId,
			position: from + at,
			value,
			clientKey: key,
			createdAt: ctx.now
		}))
	);
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'run.record',
			subjectKind: 'campaign',
			subjectId: cell.campaignId,
			after: { cell: cell.name, run: runId, readings: fresh.map(({ value }) => value) }
		}
	]);
	return takeSignatureOff(
		ctx,
		cell,
		`${fresh.length === 1 ? 'A reading was' : `${fresh.length} readings were`} added after the signature.`
	);
}
