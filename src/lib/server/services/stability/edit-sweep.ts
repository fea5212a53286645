import { may } from '../../../domain/people/policy';
import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ArchiveInput } from '../../../schemas/ladder';
import type { SweepEdit } from '../../../schemas/sweep';
import type { Context } from '../../context';
import * as sweeps from '../../db/queries/sweep';
import { findSweep } from './find-sweep';
import { writeChange } from './write-change';

const place = { kind: 'sweep' as const, find: findSweep, lock: sweeps.lock, update: sweeps.update };

/** Changes name, purpose, wanted clock and step of a sweep over the version that was seen; its passes stay as they are. */
export async function editSweep(
	ctx: Context,
	ref: string,
	{ version, ...change }: SweepEdit
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change sweeps.');
	return writeChange(ctx, place, { ref, act: 'edit', version, change });
}

/** Puts a sweep away, or takes it out of the archive again. */
export async function archiveSweep(
	ctx: Context,
	ref: string,
	{ archived, version }: ArchiveInput
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put sweeps away.');
	const change = { archivedAt: archived === 'yes' ? ctx.now : null };
	return writeChange(ctx, place, { ref, act: 'archive', version, change });
}
