import { may } from '../../../domain/people/policy';
import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ArchiveInput, LadderEdit } from '../../../schemas/ladder';
import type { Context } from '../../context';
import * as ladders from '../../db/queries/ladder';
import { findLadder } from './find-ladder';
import { writeChange } from './write-change';

const place = { kind: 'ladder' as const, find: findLadder, lock: ladders.lock, update: ladders.update };

/** Changes name, purpose, step and limits of a ladder over the version that was seen; its attempts stay as they are. */
export async function editLadder(
	ctx: Context,
	ref: string,
	{ version, ...change }: LadderEdit
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change ladders.');
	return writeChange(ctx, place, { ref, act: 'edit', version, change });
}

/** Puts a ladder away, or takes it out of the archive again. */
export async function archiveLadder(
	ctx: Context,
	ref: string,
	{ archived, version }: ArchiveInput
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put ladders away.');
	const change = { archivedAt: archived === 'yes' ? ctx.now : null };
	return writeChange(ctx, place, { ref, act: 'archive', version, change });
}
