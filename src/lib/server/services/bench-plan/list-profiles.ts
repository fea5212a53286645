import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { grouped } from '../../../domain/shared/grouped';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { ProfilesQuery } from '../../../schemas/profile';
import type { Context } from '../../context';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';

type Listed = Awaited<ReturnType<typeof profiles.list>>[number];
type Setting = Awaited<ReturnType<typeof profiles.settingsOf>>[number];
export type ProfileRow = Listed & { parentSlug: string | null; settings: Omit<Setting, 'profileId'>[] };

/** One page of the profiles, of one rig or of all, with the settings each sets itself. */
export async function listProfiles(
	ctx: Context,
	{ rig, ...query }: ProfilesQuery
): Promise<Outcome<Paged<ProfileRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const rigIds = rig ? (await rigs.byRefs(ctx.db, [rig])).map((row) => row.id) : undefined;
	const filter = { ...query, rigIds };
	const [rows, total] = await Promise.all([
		profiles.list(ctx.db, { ...filter, limit: pageSize, offset: (query.page - 1) * pageSize }),
		profiles.total(ctx.db, filter)
	]);
	const [settings, parents] = await Promise.all([
		profiles.settingsOf(
			ctx.db,
			rows.map((row) => row.id)
		),
		profiles.byIds(ctx.db, [...new Set(rows.flatMap((row) => row.parentId ?? []))])
	]);
	const slugOfParent = new Map(parents.map((parent) => [parent.id, parent.slug]));
	const settingsOf = grouped(settings, (setting) => setting.profileId);
	return done(
		paged(
			rows.map((row) => ({
				...row,
				parentSlug: row.parentId === null ? null : (slugOfParent.get(row.parentId) ?? null),
				settings: (settingsOf.get(row.id) ?? []).map(({ profileId: _, ...setting }) => setting)
			})),
			total,
			query.page
		)
	);
}
