import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { grouped } from '../../../domain/shared/grouped';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { RigsQuery } from '../../../schemas/rig';
import type { Context } from '../../context';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';
import * as samples from '../../db/queries/sample';

type Listed = Awaited<ReturnType<typeof rigs.list>>[number];
type RigSample = Awaited<ReturnType<typeof revisions.samplesOf>>[number];
export type RigRow = Listed & { samples: RigSample[]; profiles: number; campaigns: number };

/** One page of the rigs as they stand now, with their samples and how much is planned on them. */
export async function listRigs(
	ctx: Context,
	{ sample, ...query }: RigsQuery
): Promise<Outcome<Paged<RigRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [wanted] = sample ? await samples.byRefs(ctx.db, [sample]) : [];
	if (sample && !wanted) return done(paged<RigRow>([], 0, query.page));
	const filter = { ...query, sampleId: wanted?.id };
	const [rows, total] = await Promise.all([
		rigs.list(ctx.db, { ...filter, limit: pageSize, offset: (query.page - 1) * pageSize }),
		rigs.total(ctx.db, filter)
	]);
	const ids = rows.map((row) => row.id);
	const [units, profiles, campaigns] = await Promise.all([
		revisions.samplesOf(
			ctx.db,
			rows.map((row) => row.revisionId)
		),
		rigs.profileCounts(ctx.db, ids),
		rigs.campaignCounts(ctx.db, ids)
	]);
	const unitsOf = grouped(units, (unit) => unit.revisionId);
	const profilesOf = new Map(profiles.map((row) => [row.rigId, row.n]));
	const campaignsOf = new Map(campaigns.map((row) => [row.rigId, row.n]));
	return done(
		paged(
			rows.map((row) => ({
				...row,
				samples: unitsOf.get(row.revisionId) ?? [],
				profiles: profilesOf.get(row.id) ?? 0,
				campaigns: campaignsOf.get(row.id) ?? 0
			})),
			total,
			query.page
		)
	);
}
