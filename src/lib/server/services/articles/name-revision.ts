import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RevisionName } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as audit from '../../db/queries/audit';
import * as revisions from '../../db/queries/revision';
import { forbiddenWords } from './take-article';

/** Gives a revision a name to find it by, or takes the name away; the text stays as it is. */
export const nameRevision = (
	ctx: Context,
	slug: string,
	{ number, label }: RevisionName
): Promise<Outcome<{ label: string | null }, 'not_found' | 'forbidden'>> =>
	inTransaction(ctx.db, async (tx) => {
		if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
		const row = await articles.lockBySlug(tx, slug);
		if (!row) return refuse('not_found', 'There is no such article.');
		if (!may(ctx.actor, 'article.edit', { authorId: row.authorId }))
			return refuse('forbidden', forbiddenWords(ctx, 'article.edit', row.authorId));
		const before = await revisions.byNumber(tx, row.id, number);
		if (!before) return refuse('not_found', 'There is no such revision of this article.');
		const name = label === '' ? null : label;
		if (before.label === name) return done({ label: name });
		await revisions.setLabel(tx, before.id, name);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'article.name-revision',
				subjectKind: 'article',
				subjectId: row.id,
				before: { revision: number, name: before.label },
				after: { revision: number, name }
			}
		]);
		return done({ label: name });
	});
