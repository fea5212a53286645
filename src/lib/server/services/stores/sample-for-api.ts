import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SamplesApiQuery } from '../../../schemas/sample';
import type { Context } from '../../context';
import * as parts from '../../db/queries/part';
import * as samples from '../../db/queries/sample';

type Sample = Awaited<ReturnType<typeof samples.list>>[number];
type InRig = Awaited<ReturnType<typeof samples.rigsOf>>[number];

const describeSample = (sample: Sample, rigs: InRig[]) => ({
	id: sample.id,
	slug: sample.slug,
	part: { slug: sample.partSlug, maker: sample.maker, model: sample.model, kind: sample.kind },
	serial: sample.serial,
	provenance: sample.provenance,
	condition: sample.condition,
	place: sample.place,
	rigs: rigs
		.filter((rig) => rig.sampleId === sample.id && rig.revision === rig.newest)
		.map((rig) => rig.slug),
	createdAt: sample.createdAt
});

export type SampleItem = ReturnType<typeof describeSample>;

/** Samples in the order they were added, one more than asked for where there are more. */
export async function listSamplesForApi(
	ctx: Context,
	{ part, ...query }: SamplesApiQuery
): Promise<Outcome<SampleItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const partIds = part ? (await parts.byRefs(ctx.db, [part])).map((row) => row.id) : undefined;
	if (partIds?.length === 0) return done([]);
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await samples.list(ctx.db, { ...query, partIds, sort: 'id', way: 'up', ...window });
	const rigs = await samples.rigsOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	return done(rows.map((row) => describeSample(row, rigs)));
}

/** A sample by slug or id. */
export async function sampleForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<SampleItem, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const [sample] = await samples.byRefs(ctx.db, [ref]);
	if (!sample) return refuse('not_found', `There is no sample “${ref}” in the stores.`);
	return done(describeSample(sample, await samples.rigsOf(ctx.db, [sample.id])));
}
