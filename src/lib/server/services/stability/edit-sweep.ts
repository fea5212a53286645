import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { ArchiveInput } from '../../../schemas/ladder';
import type { SweepEdit } from '../../../schemas/sweep';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as sweeps from '../../db/queries/sweep';
import { findSweep } from './find-sweep';

type Change = Omit<SweepEdit, 'version'> | { archivedAt: Date | null };

async function write(
	ctx: Context,
	ref: string,
	{ act, version, change }: { act: string; version: number; change: Change }
): Promise<Outcome<{ slug: string }>> {
	return inTransaction(ctx.db, async (tx) => {
		const found = await findSweep({ db: tx }, ref);
		if (!found.ok) return found;
		const before = await sweeps.lock(tx, found.value.id);
		if (!before) return refuse('not_found', `There is no sweep “${ref}” on the bench.`);
		if (!(await sweeps.update(tx, before.id, version, change)))
			return changedMeanwhile('sweep', before.version);
		const was = Object.fromEntries(
			Object.keys(change).map((key) => [key, before[key as keyof typeof before]])
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act,
				subjectKind: 'sweep',
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}

/** Changes name, purpose, wanted clock and step of a sweep over the version that was seen; its passes stay as they are. */
export async function editSweep(
	ctx: Context,
	ref: string,
	{ version, ...change }: SweepEdit
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change sweeps.');
	return write(ctx, ref, { act: 'sweep.edit', version, change });
}

/** Puts a sweep away, or takes it out of the archive again. */
export async function archiveSweep(
	ctx: Context,
	ref: string,
	{ archived, version }: ArchiveInput
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put sweeps away.');
	const change = { archivedAt: archived === 'yes' ? ctx.now : null };
	return write(ctx, ref, { act: 'sweep.archive', version, change });
}
