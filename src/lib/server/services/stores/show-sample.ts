import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as samples from '../../db/queries/sample';

/** What comes with a sample, as far as the reader of the page may know it. */
async function dutiesOf(ctx: Context, sampleId: number) {
	if (!may(ctx.actor, 'loan.duties')) return null;
	const [loans, embargoes] = await Promise.all([
		samples.loansOf(ctx.db, [sampleId]),
		samples.embargoesOf(ctx.db, [sampleId])
	]);
	return {
		embargoes: embargoes.filter(({ until }) => until > ctx.now).map(({ field, until }) => ({ field, until })),
		disclosures: loans.map((loan) => loan.disclosure).filter((text) => text !== ''),
		// Terms and partners are the liaison's.
		loans: may(ctx.actor, 'loan.read')
			? loans.map(({ loanId, stage, dueOn, partnerName, partnerSlug }) => ({
					loanId,
					stage,
					dueOn,
					partnerName,
					partnerSlug
				}))
			: []
	};
}

async function pageOf(ctx: Context, ref: string) {
	const [sample] = await samples.byRefs(ctx.db, [ref]);
	if (!sample) return null;
	const [rigs, campaigns, duties] = await Promise.all([
		samples.rigsOf(ctx.db, [sample.id]),
		may(ctx.actor, 'usage.read') || may(ctx.actor, 'bench.read')
			? samples.campaignsOf(ctx.db, [sample.id])
			: [],
		dutiesOf(ctx, sample.id)
	]);
	return { sample, rigs, campaigns, duties };
}

export type SamplePage = NonNullable<Awaited<ReturnType<typeof pageOf>>>;

/** A sample by slug or id: what it is, where it is, where it is used and what duties came with it. Never results. */
export async function showSample(
	ctx: Context,
	ref: string
): Promise<Outcome<SamplePage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const page = await pageOf(ctx, ref);
	return page ? done(page) : refuse('not_found', `There is no sample “${ref}” in the stores.`);
}
