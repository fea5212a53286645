import { sweepSpec, type SweepSpec } from '../../../domain/articles/plates/sweep-spec';
import { sweepReport, type SweepFacts } from '../../../domain/bench/stability/sweep-facts';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import * as facts from '../../db/queries/stability-facts';
import type { SweepRow } from '../../db/queries/sweep';
import { findSweep } from './find-sweep';

export interface SweepPage {
	sweep: SweepRow;
	facts: SweepFacts;
	/** Voided ones too, by number. */
	passes: Awaited<ReturnType<typeof facts.ofSweeps>>[number]['passes'];
	/** Null before the first pass. */
	report: ReturnType<typeof sweepReport>;
	plate: SweepSpec | null;
	zone: string;
}

/** A sweep with its passes and what they say. */
export async function readSweep(
	ctx: Context,
	ref: string
): Promise<Outcome<SweepPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findSweep(ctx, ref);
	if (!found.ok) return found;
	const [[whole], { zone }] = await Promise.all([
		facts.ofSweeps(ctx.db, [found.value]),
		settings.publication(ctx.db)
	]);
	if (!whole) throw new Error('A sweep was found and then was not.');
	return done({
		sweep: found.value,
		facts: whole.facts,
		passes: whole.passes,
		report: sweepReport(whole.facts),
		plate: sweepSpec(whole.facts, zone),
		zone
	});
}
