import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { RigCorrect } from '../../../schemas/rig';
import type { Context } from '../../context';
import { inTransaction, type Db } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';
import { sampleIdsOf } from './rig-samples';

type Rig = Awaited<ReturnType<typeof rigs.byRefs>>[number];
type Revision = Pick<RigCorrect, 'firmware' | 'driver' | 'os'> & { sampleIds: number[] };

async function asItStands(tx: Db, rig: Rig): Promise<Revision> {
	const units = await revisions.samplesOf(tx, [rig.revisionId]);
	const { firmware, driver, os } = rig;
	return { firmware, driver, os, sampleIds: units.map((unit) => unit.sampleId) };
}

const same = (a: Revision, b: Revision) =>
	a.firmware === b.firmware &&
	a.driver === b.driver &&
	a.os === b.os &&
	a.sampleIds.length === b.sampleIds.length &&
	a.sampleIds.every((id) => b.sampleIds.includes(id));

/** Renames a rig or names its firmware family, and mends its newest revision as long as nothing was measured on it; afterwards only a new revision can differ. */
export async function correctRig(
	ctx: Context,
	ref: string,
	input: RigCorrect
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change rigs.');
	const { version, name, firmwareFamily, firmware, driver, os } = input;
	return inTransaction(ctx.db, async (tx) => {
		const [rig] = await rigs.byRefs(tx, [ref]);
		if (!rig) return refuse('not_found', `There is no rig “${ref}” on the bench.`);
		const units = await sampleIdsOf(tx, input.samples);
		if (!units.ok) return units;
		await revisions.lock(tx, rig.revisionId);
		const before = await asItStands(tx, rig);
		const after = { firmware, driver, os, sampleIds: units.value };
		const mends = !same(before, after);
		if (mends && (await revisions.measured(tx, [rig.revisionId])).size > 0)
			return refuse(
				'conflict',
				`Nothing was saved: runs were measured on revision ${rig.revision}, so it stays as it is. Revise the rig to write down what is different now.`
			);
		if (!(await rigs.update(tx, rig.id, version, { name, firmwareFamily })))
			return changedMeanwhile('rig', rig.version);
		if (mends) await revisions.correct(tx, rig.revisionId, { firmware, driver, os }, units.value);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'rig.correct',
				subjectKind: 'rig',
				subjectId: rig.id,
				before: { name: rig.name, firmwareFamily: rig.firmwareFamily, ...before },
				after: { name, firmwareFamily, ...after }
			}
		]);
		return done({ slug: rig.slug });
	});
}
