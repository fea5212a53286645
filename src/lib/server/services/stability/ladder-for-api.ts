import { highestPassed } from '../../../domain/bench/stability/highest-passed';
import { demandsOf } from '../../../domain/bench/stability/ladder-facts';
import { ladderReport } from '../../../domain/bench/stability/ladder-report';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LaddersApiQuery } from '../../../schemas/ladder';
import type { Context } from '../../context';
import * as ladders from '../../db/queries/ladder';
import * as facts from '../../db/queries/stability-facts';
import { findLadder } from './find-ladder';
import { ladderStart } from './ladder-start';

type Whole = Awaited<ReturnType<typeof facts.ofLadders>>[number];

function describeLadder({ row, facts: ladder }: Whole) {
	const { kinds } = highestPassed(ladder.attempts, demandsOf(ladder));
	return {
		id: row.id,
		slug: row.slug,
		name: row.name,
		purpose: row.purpose,
		rig: ladder.rig,
		profile: ladder.profile,
		stepMHz: ladder.stepMHz,
		limits: ladder.limits,
		stresses: ladder.stresses,
		highestPassed: { heaviestMHz: kinds.heaviest.clockMHz, everydayMHz: kinds.everyday.clockMHz },
		attempts: ladder.attempts.length,
		archived: row.archivedAt !== null,
		createdAt: row.createdAt
	};
}

export type LadderItem = ReturnType<typeof describeLadder>;

/** Ladders in the order they were begun, one more than asked for where there are more. */
export async function listLaddersForApi(
	ctx: Context,
	query: LaddersApiQuery
): Promise<Outcome<LadderItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await ladders.list(ctx.db, { ...query, sort: 'id', way: 'up', ...window });
	return done((await facts.ofLadders(ctx.db, rows)).map(describeLadder));
}

async function wholeOf(ctx: Context, row: ladders.LadderRow) {
	const [[whole], start] = await Promise.all([facts.ofLadders(ctx.db, [row]), ladderStart(ctx.db, row)]);
	if (!whole) throw new Error('A ladder was found and then was not.');
	const report = ladderReport(whole.facts, { start });
	return {
		...describeLadder(whole),
		attempts: whole.attempts.map(({ ladderId: _, stressName: __, voidedAt, voidReason, ...one }) => ({
			...one,
			voided: voidedAt === null ? null : (voidReason ?? '')
		})),
		next: report.stresses.map(({ stress, next }) => ({ stress: stress.slug, next })),
		contradictions: report.contradictions
	};
}

export type LadderWhole = Awaited<ReturnType<typeof wholeOf>>;

/** A ladder by slug or id with every attempt, the newest first, and what to try next under each stress. */
export async function ladderForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<LadderWhole, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findLadder(ctx, ref);
	return found.ok ? done(await wholeOf(ctx, found.value)) : found;
}
