import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { ArchiveInput, LadderEdit } from '../../../schemas/ladder';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as ladders from '../../db/queries/ladder';
import { findLadder } from './find-ladder';

type Change = Omit<LadderEdit, 'version'> | { archivedAt: Date | null };

async function write(
	ctx: Context,
	ref: string,
	{ act, version, change }: { act: string; version: number; change: Change }
): Promise<Outcome<{ slug: string }>> {
	return inTransaction(ctx.db, async (tx) => {
		const found = await findLadder({ db: tx }, ref);
		if (!found.ok) return found;
		const before = await ladders.lock(tx, found.value.id);
		if (!before) return refuse('not_found', `There is no ladder “${ref}” on the bench.`);
		if (!(await ladders.update(tx, before.id, version, change)))
			return changedMeanwhile('ladder', before.version);
		const was = Object.fromEntries(
			Object.keys(change).map((key) => [key, before[key as keyof typeof before]])
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act,
				subjectKind: 'ladder',
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}

/** Changes name, purpose, step and limits of a ladder over the version that was seen; its attempts stay as they are. */
export async function editLadder(
	ctx: Context,
	ref: string,
	{ version, ...change }: LadderEdit
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change ladders.');
	return write(ctx, ref, { act: 'ladder.edit', version, change });
}

/** Puts a ladder away, or takes it out of the archive again. */
export async function archiveLadder(
	ctx: Context,
	ref: string,
	{ archived, version }: ArchiveInput
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put ladders away.');
	const change = { archivedAt: archived === 'yes' ? ctx.now : null };
	return write(ctx, ref, { act: 'ladder.archive', version, change });
}
