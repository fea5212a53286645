import { profileReading } from '../../../domain/bench/tuning/lab-reading';
import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ProfilesApiQuery } from '../../../schemas/profile';
import type { Context } from '../../context';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';
import { showProfile, showProfileById, type ProfilePage } from './show-profile';

type Row = Awaited<ReturnType<typeof profiles.list>>[number];
type Setting = Awaited<ReturnType<typeof profiles.settingsOf>>[number];

const describeProfile = (row: Row, parent: string | null, settings: Omit<Setting, 'profileId'>[]) => ({
	id: row.id,
	rig: row.rigSlug,
	slug: row.slug,
	name: row.name,
	parent,
	notes: row.notes,
	settings,
	createdAt: row.createdAt
});

export type ProfileItem = ReturnType<typeof describeProfile>;

/** Profiles of one rig or of all, in the order they were written, one more than asked for where there are more. */
export async function listProfilesForApi(
	ctx: Context,
	{ rig, ...query }: ProfilesApiQuery
): Promise<Outcome<ProfileItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const rigIds = rig ? (await rigs.byRefs(ctx.db, [rig])).map((row) => row.id) : undefined;
	const rows = await profiles.list(ctx.db, { ...query, rigIds, limit: query.limit + 1 });
	const [settings, parents] = await Promise.all([
		profiles.settingsOf(
			ctx.db,
			rows.map((row) => row.id)
		),
		profiles.byIds(ctx.db, [...new Set(rows.flatMap((row) => row.parentId ?? []))])
	]);
	const slugOf = new Map(parents.map((parent) => [parent.id, parent.slug]));
	const settingsOf = grouped(settings, (setting) => setting.profileId);
	return done(
		rows.map((row) =>
			describeProfile(
				row,
				row.parentId === null ? null : (slugOf.get(row.parentId) ?? null),
				(settingsOf.get(row.id) ?? []).map(({ profileId: _, ...setting }) => setting)
			)
		)
	);
}

function wholeProfile({ profile, lineage, lab }: ProfilePage) {
	const { settings: effective, derived, advice } = profileReading(lineage, lab);
	const parent = lineage.at(-2)?.slug ?? null;
	return {
		...describeProfile(profile, parent, lineage.at(-1)?.settings ?? []),
		/** With what it inherits, in menu order, and what parent and stock have there. */
		effective,
		derived,
		advice
	};
}

export type WholeProfile = ReturnType<typeof wholeProfile>;

/** A profile by id, or by slug of a rig, with what it inherits, what follows from it and what is worth another look. */
export async function profileForApi(
	ctx: Context,
	ref: string,
	rig?: string
): Promise<Outcome<WholeProfile, 'forbidden' | 'not_found' | 'invalid'>> {
	const isId = /^[1-9]\d{0,9}$/.test(ref);
	if (!rig && !isId)
		return refuse(
			'invalid',
			'A profile’s slug is unique within its rig: name the rig with ?rig=…, or give the id.'
		);
	const shown = rig ? await showProfile(ctx, rig, ref) : await showProfileById(ctx, Number(ref));
	return shown.ok ? done(wholeProfile(shown.value)) : shown;
}
