import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';

async function offerOf(ctx: Context, rigRef: string) {
	const [rig] = await rigs.byRefs(ctx.db, [rigRef]);
	if (!rig) return null;
	const tree = await profiles.ofRigs(ctx.db, [rig.id]);
	const [settings, labOf] = await Promise.all([
		profiles.settingsOf(
			ctx.db,
			tree.map((one) => one.id)
		),
		knowledge.ofRigs(ctx.db, [rig.id])
	]);
	const settingsOf = grouped(settings, (setting) => setting.profileId);
	return {
		rig: { slug: rig.slug, name: rig.name },
		lab: labOf(rig.id),
		profiles: tree.map(({ id, slug, name, parentId, notes }) => ({
			id,
			slug,
			name,
			parentId,
			notes,
			settings: (settingsOf.get(id) ?? []).map(({ profileId: _, ...setting }) => setting)
		}))
	};
}

export type ProfileOffer = NonNullable<Awaited<ReturnType<typeof offerOf>>>;

/** What a new profile of a rig can stand over: every profile with the settings it makes itself. */
export async function offerProfile(
	ctx: Context,
	rigRef: string
): Promise<Outcome<ProfileOffer, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers write profiles.');
	const offer = await offerOf(ctx, rigRef);
	return offer ? done(offer) : refuse('not_found', `There is no rig “${rigRef}” on the bench.`);
}
