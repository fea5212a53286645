import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { SamplesQuery } from '../../../schemas/sample';
import type { Context } from '../../context';
import * as parts from '../../db/queries/part';
import * as samples from '../../db/queries/sample';

type Listed = Awaited<ReturnType<typeof samples.list>>[number];
export type SampleRow = Listed & {
	/** Rigs that have the sample now. */
	rigs: { slug: string; name: string }[];
};

/** One page of the samples with their part and the rigs they are in now. */
export async function listSamples(
	ctx: Context,
	{ part, ...query }: SamplesQuery
): Promise<Outcome<Paged<SampleRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const partIds = part ? (await parts.byRefs(ctx.db, [part])).map((row) => row.id) : undefined;
	if (partIds?.length === 0) return done(paged<SampleRow>([], 0, query.page));
	const filter = { ...query, partIds };
	const [rows, total] = await Promise.all([
		samples.list(ctx.db, { ...filter, limit: pageSize, offset: (query.page - 1) * pageSize }),
		samples.total(ctx.db, filter)
	]);
	const rigs = await samples.rigsOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	const now = rigs.filter((rig) => rig.revision === rig.newest);
	return done(
		paged(
			rows.map((row) => ({
				...row,
				rigs: now.filter((rig) => rig.sampleId === row.id).map(({ slug, name }) => ({ slug, name }))
			})),
			total,
			query.page
		)
	);
}
