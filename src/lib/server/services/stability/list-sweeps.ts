import { sweepReport } from '../../../domain/bench/stability/sweep-facts';
import type { SwitchPoint } from '../../../domain/bench/stability/switch-point';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { SweepsQuery } from '../../../schemas/sweep';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import * as facts from '../../db/queries/stability-facts';
import * as sweeps from '../../db/queries/sweep';

export interface SweepListRow extends Pick<
	sweeps.SweepRow,
	| 'id'
	| 'slug'
	| 'name'
	| 'rigSlug'
	| 'rigName'
	| 'revision'
	| 'profileSlug'
	| 'profileName'
	| 'wantedClockMhz'
	| 'archivedAt'
> {
	/** Null before the first pass. */
	point: Pick<SwitchPoint, 'kind' | 'crossingA' | 'ci95' | 'setA'> | null;
	passes: number;
	lastAt: Date | null;
}

async function rowsOf(ctx: Context, rows: sweeps.SweepRow[]): Promise<SweepListRow[]> {
	const all = await facts.ofSweeps(ctx.db, rows);
	return all.map(({ row, facts: sweep, passes }) => ({
		...row,
		point: sweepReport(sweep)?.point ?? null,
		passes: sweep.passes.length,
		lastAt: passes.findLast((pass) => pass.voidedAt === null)?.startedAt ?? null
	}));
}

/** One page of the sweeps with where each crosses, and the rigs to filter by. */
export async function listSweeps(
	ctx: Context,
	query: SweepsQuery
): Promise<
	Outcome<{ list: Paged<SweepListRow>; rigs: { slug: string; name: string }[]; zone: string }, 'forbidden'>
> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, total, rigs, { zone }] = await Promise.all([
		sweeps.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		sweeps.total(ctx.db, query),
		sweeps.rigsUsed(ctx.db),
		settings.publication(ctx.db)
	]);
	return done({ list: paged(await rowsOf(ctx, rows), total, query.page), rigs, zone });
}
