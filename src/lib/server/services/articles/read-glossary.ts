import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { TermsQuery } from '../../../schemas/glossary';
import { paged, pageSize } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as terms from '../../db/queries/glossary-term';

const notForYou = () =>
	refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');

/** One page of the glossary. */
export async function listTerms(ctx: Context, query: TermsQuery) {
	if (!may(ctx.actor, 'article.read')) return notForYou();
	const [rows, total] = await Promise.all([
		terms.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		terms.total(ctx.db, query)
	]);
	return done({ ...paged(rows, total, query.page), mayEdit: may(ctx.actor, 'glossary.edit') });
}

/** One term of the glossary. */
export async function showTerm(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'article.read')) return notForYou();
	const term = await terms.bySlug(ctx.db, slug);
	return term ? done(term) : refuse('not_found', `There is no term “${slug}” in the glossary.`);
}
