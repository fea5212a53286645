import { fillTemplate } from '../../../domain/articles/fill-template';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as templates from '../../db/queries/article-template';
import * as campaigns from '../../db/queries/campaign-choice';
import { shippedTemplate } from '../../rendering/templates';
import { articleData } from './article-data';
import { renderNow } from './open-article';
import { templateInUse, templatesInUse } from './templates-in-use';

const notForYou = () =>
	refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
const none = (kind: string) => refuse('not_found', `There is no template “${kind}”.`);

/** Every template as it stands. */
export async function listTemplates(ctx: Context) {
	if (!may(ctx.actor, 'article.read')) return notForYou();
	const all = await templatesInUse(ctx.db);
	return done({
		rows: all.map(({ body: _, checklist, ...row }) => ({ ...row, items: checklist.length })),
		mayEdit: may(ctx.actor, 'template.edit')
	});
}

/** One template to be changed, with its saves. */
export async function showTemplate(ctx: Context, kind: string) {
	if (!may(ctx.actor, 'template.edit')) return refuse('forbidden', 'Only editors change templates.');
	const template = await templateInUse(ctx.db, kind);
	if (!template) return none(kind);
	const saves = template.own ? await templates.revisionsOf(ctx.db, template.own.id, 30) : [];
	return done({ template, saves, ships: shippedTemplate(kind) !== undefined });
}

/** A template as an article would begin from it with a campaign: that of the article printed last where none is named. */
export async function previewTemplate(ctx: Context, kind: string, campaign: string) {
	if (!may(ctx.actor, 'article.read')) return notForYou();
	const [template, choices, printed] = await Promise.all([
		templateInUse(ctx.db, kind),
		campaigns.open(ctx.db),
		campaigns.lastPrinted(ctx.db)
	]);
	if (!template) return none(kind);
	const named = (name: string | undefined) => choices.find(({ slug }) => slug === name);
	const chosen = named(campaign) ?? named(printed) ?? choices[0];
	const ids = chosen ? (await campaigns.idsOf(ctx.db, [chosen.slug])).map(({ id }) => id) : [];
	const data = await articleData(ctx, ids);
	const source = fillTemplate(template.body, data);
	const { html, rendered } = renderNow(kind, source, data);
	return done({
		template: { kind, name: template.name, title: template.title, standfirst: template.standfirst },
		checklist: template.checklist,
		choices: choices.map(({ slug, name }) => ({ slug, name })),
		campaign: chosen?.slug ?? '',
		source,
		html,
		errors: rendered.errors.map(({ line, message }) => ({ line, message })),
		mayEdit: may(ctx.actor, 'template.edit')
	});
}
