import { sweepReport } from '../../../domain/bench/stability/sweep-facts';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SweepsApiQuery } from '../../../schemas/sweep';
import type { Context } from '../../context';
import * as facts from '../../db/queries/stability-facts';
import * as sweeps from '../../db/queries/sweep';
import { findSweep } from './find-sweep';

type Whole = Awaited<ReturnType<typeof facts.ofSweeps>>[number];

function describeSweep({ row, facts: sweep }: Whole) {
	const report = sweepReport(sweep);
	return {
		id: row.id,
		slug: row.slug,
		name: row.name,
		purpose: row.purpose,
		rig: sweep.rig,
		profile: sweep.profile,
		workload: sweep.workload,
		wantedClockMHz: sweep.wantedMHz,
		currentStepA: sweep.stepA,
		switchPoint: report && {
			kind: report.point.kind,
			crossingA: report.point.crossingA,
			ci95: report.point.ci95,
			marginA: report.point.marginA,
			setA: report.point.setA,
			words: report.words
		},
		archived: row.archivedAt !== null,
		createdAt: row.createdAt
	};
}

export type SweepItem = ReturnType<typeof describeSweep>;

/** Sweeps in the order they were begun, one more than asked for where there are more. */
export async function listSweepsForApi(
	ctx: Context,
	query: SweepsApiQuery
): Promise<Outcome<SweepItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await sweeps.list(ctx.db, { ...query, sort: 'id', way: 'up', ...window });
	return done((await facts.ofSweeps(ctx.db, rows)).map(describeSweep));
}

const describePass = ({ sweepId: _, voidedAt, voidReason, ...pass }: Whole['passes'][number]) => ({
	...pass,
	voided: voidedAt === null ? null : (voidReason ?? '')
});

export type SweepWhole = SweepItem & { passes: ReturnType<typeof describePass>[] };

/** A sweep by slug or id with every pass. */
export async function sweepForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<SweepWhole, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findSweep(ctx, ref);
	if (!found.ok) return found;
	const [whole] = await facts.ofSweeps(ctx.db, [found.value]);
	if (!whole) throw new Error('A sweep was found and then was not.');
	return done({ ...describeSweep(whole), passes: whole.passes.map(describePass) });
}
