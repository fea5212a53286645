import { highestPassed } from '../../../domain/bench/stability/highest-passed';
import { demandsOf } from '../../../domain/bench/stability/ladder-facts';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LaddersQuery } from '../../../schemas/ladder';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as ladders from '../../db/queries/ladder';
import * as settings from '../../db/queries/settings';
import * as facts from '../../db/queries/stability-facts';

export interface LadderListRow extends Pick<
	ladders.LadderRow,
	'id' | 'slug' | 'name' | 'rigSlug' | 'rigName' | 'revision' | 'profileSlug' | 'profileName' | 'archivedAt'
> {
	/** Highest clock that every stress of the kind passed, in MHz; null where one has passed none. */
	heaviestMHz: number | null;
	everydayMHz: number | null;
	attempts: number;
	lastAt: Date | null;
}

async function rowsOf(ctx: Context, rows: ladders.LadderRow[]): Promise<LadderListRow[]> {
	const all = await facts.ofLadders(ctx.db, rows);
	return all.map(({ row, facts: ladder, attempts }) => {
		const { kinds } = highestPassed(ladder.attempts, demandsOf(ladder));
		return {
			...row,
			heaviestMHz: kinds.heaviest.clockMHz,
			everydayMHz: kinds.everyday.clockMHz,
			attempts: ladder.attempts.length,
			lastAt: attempts.find((one) => one.voidedAt === null)?.startedAt ?? null
		};
	});
}

/** One page of the ladders with how far each was climbed, and the rigs to filter by. */
export async function listLadders(
	ctx: Context,
	query: LaddersQuery
): Promise<
	Outcome<{ list: Paged<LadderListRow>; rigs: { slug: string; name: string }[]; zone: string }, 'forbidden'>
> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, total, rigs, { zone }] = await Promise.all([
		ladders.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		ladders.total(ctx.db, query),
		ladders.rigsUsed(ctx.db),
		settings.publication(ctx.db)
	]);
	return done({ list: paged(await rowsOf(ctx, rows), total, query.page), rigs, zone });
}
