import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as partners from '../../db/queries/partner';
import * as samples from '../../db/queries/sample';

/** The partner asked, and the samples a loan may hold: all that were not bought. */
export async function lendableSamples(ctx: Context, partnerSlug: string) {
	if (!may(ctx.actor, 'loan.edit')) return refuse('forbidden', 'Only a liaison opens loans.');
	const [partner, choices] = await Promise.all([
		partners.bySlug(ctx.db, partnerSlug),
		samples.choices(ctx.db)
	]);
	if (!partner) return refuse('not_found', 'There is no such partner.');
	return done({
		partner: { slug: partner.slug, name: partner.name },
		samples: choices.filter((sample) => sample.provenance !== 'bought')
	});
}
