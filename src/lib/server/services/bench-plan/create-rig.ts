import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { RigInput } from '../../../schemas/rig';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as profiles from '../../db/queries/profile';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';
import { sampleIdsOf } from './rig-samples';

/** Puts samples together as a rig: its first revision, and stock, the root of its profiles. */
export async function createRig(
	ctx: Context,
	input: RigInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put rigs together.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const { name, firmwareFamily, firmware, driver, os } = input;
	const by = { createdBy: ctx.actor.id, createdAt: ctx.now };
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const units = await sampleIdsOf(tx, input.samples);
			if (!units.ok) return units;
			const id = await rigs.insert(tx, { slug, name, firmwareFamily, createdAt: ctx.now });
			const first = { rigId: id, number: 1, firmware, driver, os, change: 'First put together.', ...by };
			await revisions.insert(tx, first, units.value);
			const stock = { rigId: id, slug: 'stock', name: 'Stock', notes: '', createdAt: ctx.now };
			await profiles.insert(tx, stock, []);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'rig.create',
					subjectKind: 'rig',
					subjectId: id,
					after: { ...input, slug }
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('rig', slug);
		throw error;
	}
}
