import { unexplained } from '../../../domain/bench/tuning/lab-reading';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { grouped } from '../../../domain/shared/grouped';
import type { Context } from '../../context';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as prices from '../../db/queries/part-price';
import * as profiles from '../../db/queries/profile';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';

async function pageOf(ctx: Context, ref: string) {
	const [rig] = await rigs.byRefs(ctx.db, [ref]);
	if (!rig) return null;
	const [history, tree] = await Promise.all([
		revisions.ofRigs(ctx.db, [rig.id]),
		profiles.ofRigs(ctx.db, [rig.id])
	]);
	const revisionIds = history.map((revision) => revision.id);
	const profileIds = tree.map((profile) => profile.id);
	const [units, campaigns, measured, settings, measuredProfiles, labOf] = await Promise.all([
		revisions.samplesOf(ctx.db, revisionIds),
		revisions.campaignsOf(ctx.db, revisionIds),
		revisions.measured(ctx.db, revisionIds),
		profiles.settingsOf(ctx.db, profileIds),
		profiles.measured(ctx.db, profileIds),
		knowledge.ofRigs(ctx.db, [rig.id])
	]);
	const latest = await prices.latestOf(ctx.db, [...new Set(units.map((unit) => unit.partId))]);
	const settingsOf = grouped(settings, (setting) => setting.profileId);
	return {
		rig,
		revisions: history.map((revision) => ({
			...revision,
			samples: units.filter((unit) => unit.revisionId === revision.id),
			campaigns: campaigns.filter((campaign) => campaign.revisionId === revision.id),
			measured: measured.has(revision.id)
		})),
		profiles: tree.map((profile) => ({
			id: profile.id,
			slug: profile.slug,
			name: profile.name,
			parentId: profile.parentId,
			settings: settingsOf.get(profile.id)?.length ?? 0,
			measured: measuredProfiles.has(profile.id)
		})),
		/** Names of settings in its profiles that nothing explains. */
		unexplained: unexplained(settings, labOf(rig.id)),
		prices: latest.map(({ partId, amountMinor, currency, observedOn }) => ({
			partId,
			amountMinor,
			currency,
			observedOn
		}))
	};
}

export type RigPage = NonNullable<Awaited<ReturnType<typeof pageOf>>>;

/** A rig by slug or id: its revisions with their samples, the campaigns on them, and its tree of profiles. */
export async function showRig(
	ctx: Context,
	ref: string
): Promise<Outcome<RigPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const page = await pageOf(ctx, ref);
	return page ? done(page) : refuse('not_found', `There is no rig “${ref}” on the bench.`);
}
