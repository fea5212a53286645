import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { RigRevise } from '../../../schemas/rig';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';
import { sampleIdsOf } from './rig-samples';

/** Writes the next revision of a rig; campaigns stay on the revision they were planned on. */
export async function reviseRig(
	ctx: Context,
	ref: string,
	input: RigRevise
): Promise<Outcome<{ slug: string; revision: number }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers revise rigs.');
	const { version, samples, firmware, driver, os, change } = input;
	return inTransaction(ctx.db, async (tx) => {
		const [rig] = await rigs.byRefs(tx, [ref]);
		if (!rig) return refuse('not_found', `There is no rig “${ref}” on the bench.`);
		const units = await sampleIdsOf(tx, samples);
		if (!units.ok) return units;
		if (!(await rigs.update(tx, rig.id, version, {}))) return changedMeanwhile('rig', rig.version);
		const number = rig.revision + 1;
		const row = { rigId: rig.id, number, firmware, driver, os, change };
		await revisions.insert(tx, { ...row, createdBy: ctx.actor.id, createdAt: ctx.now }, units.value);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'rig.revise',
				subjectKind: 'rig',
				subjectId: rig.id,
				after: { number, samples, firmware, driver, os },
				reason: change
			}
		]);
		return done({ slug: rig.slug, revision: number });
	});
}
