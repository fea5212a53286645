import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { ProfileInput } from '../../../schemas/profile';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';

const notThere = (field: 'rig' | 'parent', message: string) =>
	refuse('invalid', 'Nothing was saved.', { fields: { [field]: [message] } });

/** Adds a profile to a rig's tree, over its parent or over stock. */
export async function createProfile(
	ctx: Context,
	input: ProfileInput
): Promise<Outcome<{ id: number; slug: string; rig: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers write profiles.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const { name, notes, settings } = input;
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const [rig] = await rigs.byRefs(tx, [input.rig]);
			if (!rig) return notThere('rig', `There is no rig “${input.rig}”.`);
			const [parent] = await profiles.byRefs(tx, rig.id, [input.parent ?? 'stock']);
			if (!parent) return notThere('parent', `This rig has no profile “${input.parent ?? 'stock'}”.`);
			const row = { rigId: rig.id, slug, name, notes, parentId: parent.id, createdAt: ctx.now };
			const id = await profiles.insert(tx, row, settings);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'profile.create',
					subjectKind: 'profile',
					subjectId: id,
					after: { rig: rig.slug, parent: parent.slug, slug, name, notes, settings }
				}
			]);
			return done({ id, slug, rig: rig.slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('profile of this rig', slug);
		throw error;
	}
}
