import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { SuiteInput } from '../../../schemas/suite';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as suites from '../../db/queries/suite';
import { suiteWorkloads } from './suite-workloads';

/** Puts workloads together as a suite. */
export async function createSuite(
	ctx: Context,
	input: SuiteInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put suites together.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const { name, purpose } = input;
	const by = { createdBy: ctx.actor.id, createdAt: ctx.now };
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const chosen = await suiteWorkloads(tx, input.workloads);
			if (!chosen.ok) return chosen;
			const id = await suites.insert(tx, { slug, name, purpose, ...by }, chosen.value);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'suite.create',
					subjectKind: 'suite',
					subjectId: id,
					after: { ...input, slug }
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('suite', slug);
		throw error;
	}
}
