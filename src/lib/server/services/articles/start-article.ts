import { fillTemplate } from '../../../domain/articles/fill-template';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { ArticleStart } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as campaigns from '../../db/queries/campaign-choice';
import { articleData } from './article-data';
import { createArticle } from './create-article';
import { templateInUse } from './templates-in-use';

const taken = 'Another article has this title, or one that makes the same address. Choose another.';

/**
 * Starts an article of the actor's from a template, filled in with what its campaigns have. Its address comes from its title
 * and stays. Refuses a title that makes the address of another article, beside the field.
 */
export async function startArticle(
	ctx: Context,
	input: ArticleStart
): Promise<Outcome<{ slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'article.create'))
		return refuse('forbidden', 'Only writers and editors start articles.');
	const template = await templateInUse(ctx.db, input.template);
	if (!template || template.retired)
		return refuse('invalid', 'There is no such template.', {
			fields: { template: ['There is no such template any more. Choose another.'] }
		});
	const slug = slugOf(input.title);
	if (slug === '' || isReserved(slug))
		return refuse('invalid', 'This title cannot make an address.', {
			fields: { title: ['This title cannot make an address: use a few letters or words more.'] }
		});
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const found = new Map((await campaigns.idsOf(tx, input.campaigns)).map((one) => [one.slug, one.id]));
			const ids = [...new Set(input.campaigns)].flatMap((name) => found.get(name) ?? []);
			if (ids.length < new Set(input.campaigns).size)
				return refuse('invalid', 'One of the campaigns does not exist any more.', {
					fields: { campaigns: ['One of these campaigns does not exist any more. Choose again.'] }
				});
			const data = await articleData({ db: tx, now: ctx.now }, ids);
			// The template's own standfirst tells the writer what to say; in print it would say nothing.
			const standfirst = '';
			const source = fillTemplate(template.body, data);
			await createArticle(ctx, tx, {
				...{ slug, title: input.title, standfirst, template: input.template, source, campaignIds: ids },
				note: 'from the template',
				log: { campaigns: input.campaigns }
			});
			return done({ slug });
		});
	} catch (error) {
		if (!isDuplicate(error)) throw error;
		return refuse('conflict', taken, { fields: { title: [taken] } });
	}
}
