import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ViewForget, ViewSave } from '../../../schemas/article-list';
import { articlesQuery } from '../../../schemas/article-list';
import { listAddress } from '../../../schemas/list-address';
import { readListing } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as views from '../../db/queries/desk-view';

const notHere = 'Your roles do not include the desk.';

/** Keeps a filter of the article list under a name; another of the actor's with that name is replaced. */
export async function keepView(
	ctx: Context,
	{ name, query, shared }: ViewSave
): Promise<Outcome<{ query: string }, 'forbidden' | 'invalid'>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', notHere);
	// Only what the list knows is kept, and no page of it.
	const read = readListing(articlesQuery, new URLSearchParams(query));
	const kept = listAddress(articlesQuery, read).slice(1);
	if (kept === '')
		return refuse('invalid', 'This is the list as it opens. Filter or sort it first, then keep it.', {
			fields: { name: ['This is the list as it opens. Filter or sort it first, then keep it.'] }
		});
	await views.put(ctx.db, { ownerId: ctx.actor.id, name, query: kept, shared, createdAt: ctx.now });
	return done({ query: kept });
}

/** Forgets a view of the actor's own. */
export async function forgetView(
	ctx: Context,
	{ view }: ViewForget
): Promise<Outcome<null, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', notHere);
	if (!(await views.remove(ctx.db, view, ctx.actor.id)))
		return refuse('not_found', 'You have no such view. Views of others are theirs to forget.');
	return done(null);
}
