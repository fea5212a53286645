import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RigsApiQuery } from '../../../schemas/rig';
import type { Context } from '../../context';
import * as profiles from '../../db/queries/profile';
import * as revisions from '../../db/queries/rig-revision';
import * as rigs from '../../db/queries/rig';
import * as samples from '../../db/queries/sample';

type Row = Awaited<ReturnType<typeof rigs.list>>[number];
type Unit = Awaited<ReturnType<typeof revisions.samplesOf>>[number];

const describeUnit = ({ slug, serial, provenance, partSlug, kind }: Unit) => ({
	slug,
	part: partSlug,
	kind,
	serial,
	provenance
});

const describeRig = (row: Row, units: Unit[]) => ({
	id: row.id,
	slug: row.slug,
	name: row.name,
	firmwareFamily: row.firmwareFamily,
	revision: row.revision,
	firmware: row.firmware,
	driver: row.driver,
	os: row.os,
	samples: units.map(describeUnit),
	createdAt: row.createdAt
});

export type RigItem = ReturnType<typeof describeRig>;

/** Rigs as they stand now, in the order they were put together, one more than asked for where there are more. */
export async function listRigsForApi(
	ctx: Context,
	{ sample, ...query }: RigsApiQuery
): Promise<Outcome<RigItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [wanted] = sample ? await samples.byRefs(ctx.db, [sample]) : [];
	if (sample && !wanted) return done([]);
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await rigs.list(ctx.db, { ...query, sampleId: wanted?.id, sort: 'id', way: 'up', ...window });
	const units = await revisions.samplesOf(
		ctx.db,
		rows.map((row) => row.revisionId)
	);
	const unitsOf = grouped(units, (unit) => unit.revisionId);
	return done(rows.map((row) => describeRig(row, unitsOf.get(row.revisionId) ?? [])));
}

async function wholeRig(ctx: Context, row: Row) {
	const [history, tree] = await Promise.all([
		revisions.ofRigs(ctx.db, [row.id]),
		profiles.ofRigs(ctx.db, [row.id])
	]);
	const units = await revisions.samplesOf(
		ctx.db,
		history.map((revision) => revision.id)
	);
	const unitsOf = grouped(units, (unit) => unit.revisionId);
	const slugOf = new Map(tree.map((profile) => [profile.id, profile.slug]));
	return {
		...describeRig(row, unitsOf.get(row.revisionId) ?? []),
		revisions: history.map(({ id, number, change, firmware, driver, os, createdAt }) => ({
			number,
			change,
			firmware,
			driver,
			os,
			samples: (unitsOf.get(id) ?? []).map((unit) => unit.slug),
			createdAt
		})),
		profiles: tree.map(({ id, slug, name, parentId }) => ({
			id,
			slug,
			name,
			parent: parentId === null ? null : (slugOf.get(parentId) ?? null)
		}))
	};
}

/** A rig by slug or id with its revisions, the newest first, and its profiles. */
export async function rigForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<Awaited<ReturnType<typeof wholeRig>>, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [row] = await rigs.byRefs(ctx.db, [ref]);
	return row ? done(await wholeRig(ctx, row)) : refuse('not_found', `There is no rig “${ref}” on the bench.`);
}
