import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign-choice';
import { templatesInUse } from './templates-in-use';

/** What an article can begin from: the templates with what each is for, and the open campaigns. */
export async function readStart(ctx: Context) {
	if (!may(ctx.actor, 'article.create'))
		return refuse('forbidden', 'Only writers and editors start articles.');
	const [templates, choices] = await Promise.all([templatesInUse(ctx.db), campaigns.open(ctx.db)]);
	return done({
		templates: templates
			.filter(({ retired }) => !retired)
			.map((template) => ({ value: template.kind, label: template.name, what: template.for })),
		campaigns: choices
	});
}
