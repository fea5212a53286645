import { ladderSpec, type LadderSpec } from '../../../domain/articles/plates/ladder-spec';
import { ladderReport, type LadderReport } from '../../../domain/bench/stability/ladder-report';
import type { LadderFacts } from '../../../domain/bench/stability/ladder-facts';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { AttemptRow } from '../../db/queries/attempt';
import type { LadderRow } from '../../db/queries/ladder';
import * as settings from '../../db/queries/settings';
import * as facts from '../../db/queries/stability-facts';
import { findLadder } from './find-ladder';
import { ladderStart } from './ladder-start';

export interface LadderPage {
	ladder: LadderRow;
	facts: LadderFacts;
	/** Voided ones too, the newest first. */
	attempts: AttemptRow[];
	report: LadderReport;
	/** Null before the first attempt. */
	plate: LadderSpec | null;
	zone: string;
}

/**
 * A ladder with all it says.
 * @param volts voltage to propose the next attempt at; that of the last one where null
 */
export async function readLadder(
	ctx: Context,
	ref: string,
	volts: number | null
): Promise<Outcome<LadderPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findLadder(ctx, ref);
	if (!found.ok) return found;
	const [[whole], start, { zone }] = await Promise.all([
		facts.ofLadders(ctx.db, [found.value]),
		ladderStart(ctx.db, found.value),
		settings.publication(ctx.db)
	]);
	if (!whole) throw new Error('A ladder was found and then was not.');
	return done({
		ladder: found.value,
		facts: whole.facts,
		attempts: whole.attempts,
		report: ladderReport(whole.facts, { volts, start }),
		plate: ladderSpec(whole.facts, zone),
		zone
	});
}
