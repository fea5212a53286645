import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CheckInput } from '../../../schemas/template';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as checks from '../../db/queries/article-check';
import * as audit from '../../db/queries/audit';
import { templateInUse } from './templates-in-use';

/** Ticks an item of an article's checklist off, or takes the tick back. Ticked twice, the first stands. */
export async function checkItem(
	ctx: Context,
	slug: string,
	{ group, item, checked }: CheckInput
): Promise<Outcome<null, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'article.check'))
		return refuse('forbidden', 'Only testers and editors tick the checklist off.');
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const row = await articles.lockBySlug(tx, slug);
			if (!row) return refuse('not_found', 'There is no such article.');
			const template = await templateInUse(tx, row.template);
			const known = template?.checklist.some((one) => one.group === group && one.text === item) ?? false;
			if (checked === 'yes' && !known)
				return refuse(
					'not_found',
					'This is on the checklist no more: load the page again. Nothing was ticked.'
				);
			if (checked === 'yes')
				await checks.insert(tx, {
					articleId: row.id,
					group,
					item,
					checkedBy: ctx.actor.id,
					checkedAt: ctx.now
				});
			else if (!(await checks.remove(tx, row.id, group, item))) return done(null);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: checked === 'yes' ? 'article.check' : 'article.uncheck',
					subjectKind: 'article',
					subjectId: row.id,
					after: { group, item }
				}
			]);
			return done(null);
		});
	} catch (error) {
		if (isDuplicate(error)) return done(null);
		throw error;
	}
}
