import { kindOf } from '../../../domain/articles/kinds';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign-choice';
import { articleTemplates } from '../../rendering/templates';

/** What an article can begin from: the templates with what each is for, and the open campaigns. */
export async function readStart(ctx: Context) {
	if (!may(ctx.actor, 'article.create'))
		return refuse('forbidden', 'Only writers and editors start articles.');
	return done({
		templates: articleTemplates.map((template) => ({
			value: template.kind,
			label: kindOf(template.kind),
			what: template.for
		})),
		campaigns: await campaigns.open(ctx.db)
	});
}
