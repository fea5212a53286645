import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PresenceSaid } from '../../../schemas/article';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as presence from '../../db/queries/presence';
import { forbiddenWords } from './take-article';

/** Three words of a browser may get lost before its person counts as gone. */
const goneMs = 50_000;

/** Notes that somebody has an article open to edit it, and says who else has. Nothing of it is kept once they left. */
export async function keepPresence(
	ctx: Context,
	slug: string,
	{ lastKeyAgoS, leaving }: PresenceSaid
): Promise<Outcome<{ others: { name: string; lastKeyAgoS: number | null }[] }, 'not_found' | 'forbidden'>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { id, authorId } = found.article;
	if (!may(ctx.actor, 'article.edit', { authorId }))
		return refuse('forbidden', forbiddenWords(ctx, 'article.edit', authorId));
	if (leaving) {
		await presence.leave(ctx.db, id, ctx.actor.id);
		return done({ others: [] });
	}
	const now = ctx.now.getTime();
	const lastKeyAt = lastKeyAgoS === null ? null : new Date(now - lastKeyAgoS * 1000);
	await presence.mark(ctx.db, { articleId: id, personId: ctx.actor.id, lastKeyAt, seenAt: ctx.now });
	const others = await presence.others(ctx.db, id, ctx.actor.id, new Date(now - goneMs));
	return done({
		others: others.map(({ name, lastKeyAt: last }) => ({
			name,
			lastKeyAgoS: last === null ? null : Math.max(0, Math.round((now - last.getTime()) / 1000))
		}))
	});
}
