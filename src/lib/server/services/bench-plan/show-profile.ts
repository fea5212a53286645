import { chainTo } from '../../../domain/bench/profile';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';
import { withHeirs } from './profile-tree';

type Found = Awaited<ReturnType<typeof profiles.byIds>>[number];

async function pageOf(ctx: Context, profile: Found) {
	const tree = await profiles.ofRigs(ctx.db, [profile.rigId]);
	const line = chainTo(tree, profile.id);
	const heirs = withHeirs(tree, profile.id);
	const [settings, campaigns, measured, labOf] = await Promise.all([
		profiles.settingsOf(
			ctx.db,
			line.map((one) => one.id)
		),
		profiles.campaignsOf(ctx.db, [profile.id]),
		profiles.measured(ctx.db, heirs),
		knowledge.ofRigs(ctx.db, [profile.rigId])
	]);
	const name = (id: number) => tree.find((one) => one.id === id)?.name ?? '';
	return {
		profile,
		/** What the lab knows of its rig, by which its settings are read. */
		lab: labOf(profile.rigId),
		/** From stock down to the profile itself, each with what it sets. */
		lineage: line.map((one) => ({
			slug: one.slug,
			name: one.name,
			settings: settings
				.filter((setting) => setting.profileId === one.id)
				.map(({ profileId: _, ...setting }) => setting)
		})),
		children: tree.filter((one) => one.parentId === profile.id).map(({ slug, name }) => ({ slug, name })),
		campaigns,
		/** Names of the profiles whose runs hold these settings fast: itself, or heirs of it. */
		measured: [...measured].map(name)
	};
}

export type ProfilePage = Awaited<ReturnType<typeof pageOf>>;

/** A profile of a rig by slug or id. */
export async function showProfile(
	ctx: Context,
	rigRef: string,
	ref: string
): Promise<Outcome<ProfilePage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rig] = await rigs.byRefs(ctx.db, [rigRef]);
	const [profile] = rig ? await profiles.byRefs(ctx.db, rig.id, [ref]) : [];
	if (!profile) return refuse('not_found', `There is no profile “${ref}” of the rig “${rigRef}”.`);
	return done(await pageOf(ctx, profile));
}

/** A profile by its id alone, as scripts name it. */
export async function showProfileById(
	ctx: Context,
	id: number
): Promise<Outcome<ProfilePage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [profile] = await profiles.byIds(ctx.db, [id]);
	if (!profile) return refuse('not_found', `There is no profile ${id}.`);
	return done(await pageOf(ctx, profile));
}
