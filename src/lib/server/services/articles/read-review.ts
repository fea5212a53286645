import { kindOf } from '../../../domain/articles/kinds';
import type { ArticleData } from '../../../domain/articles/data';
import { movesFor } from '../../../domain/articles/moves';
import type { Finding } from '../../../domain/articles/preflight/finding';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import type { ArticleRow } from '../../db/queries/article';
import * as filing from '../../db/queries/article-filing';
import * as audit from '../../db/queries/audit';
import * as checks from '../../db/queries/article-check';
import * as comments from '../../db/queries/comment';
import * as corrections from '../../db/queries/correction';
import * as editions from '../../db/queries/edition';
import * as revisions from '../../db/queries/revision';
import { canonicalJson } from '../../rendering/freeze-edition';
import { checkEdition, checkText, currentData } from './check-article';
import { withPictures } from './known-pictures';
import { renderNow } from './open-article';
import { hasPage } from './take-article';
import { templateInUse } from './templates-in-use';

/** What the review page shows as the page: the edition that is approved or live, else the newest text as it would print. */
interface Shown {
	title: string;
	standfirst: string;
	html: string;
	edition: { number: number; hash: string } | null;
	findings: Finding[];
	/** Whether the bench has changed since the edition was frozen. */
	benchMoved: boolean;
}

const figuresOf = ({ campaigns }: ArticleData) => canonicalJson(campaigns.map((one) => one.cells));

async function frozen(ctx: Context, row: ArticleRow, editionId: number): Promise<Shown> {
	const edition = await editions.byId(ctx.db, editionId);
	if (!edition) throw new Error(`Article ${row.id} has no edition ${editionId}.`);
	const waits = row.approvedEditionId === editionId;
	const [findings, current] = await Promise.all([
		waits ? checkEdition(ctx, ctx.db, row, row.slotAt ?? ctx.now, 'person') : [],
		currentData(ctx, ctx.db, row.id)
	]);
	const { title, standfirst, page: html, number, hash } = edition;
	const benchMoved = figuresOf(JSON.parse(edition.data) as ArticleData) !== figuresOf(current);
	return { title, standfirst, html, edition: { number, hash }, findings, benchMoved };
}

async function asItStands(ctx: Context, row: ArticleRow): Promise<Shown> {
	const head = await revisions.byNumber(ctx.db, row.id, row.head);
	if (!head) throw new Error(`Article ${row.id} has no revision ${row.head}.`);
	const data = await withPictures(ctx.db, await currentData(ctx, ctx.db, row.id), head.source);
	const { rendered, html } = renderNow(row.slug, head.source, data);
	const findings = await checkText(ctx, ctx.db, row, head.source, rendered, data, row.slotAt);
	const { title, standfirst } = head;
	return { title, standfirst, html, edition: null, findings, benchMoved: false };
}

function pageOf(ctx: Context, row: ArticleRow): Promise<Shown> {
	if (row.approvedEditionId !== null) return frozen(ctx, row, row.approvedEditionId);
	const rests = row.stage === 'published' || row.stage === 'withdrawn';
	return rests && row.liveEditionId !== null ? frozen(ctx, row, row.liveEditionId) : asItStands(ctx, row);
}

/** An article before the eyes of its editors: the page, what stops it, the comments, what can be done, what was done. */
export async function readReview(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'article.read'))
		return refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { article, authorName } = found;
	const [shown, bound, said, printed, corrected, history, handedItOn, template, ticked] = await Promise.all([
		pageOf(ctx, article),
		articles.campaignsOf(ctx.db, article.id),
		comments.ofArticle(ctx.db, article.id),
		editions.listOf(ctx.db, article.id),
		corrections.ofArticle(ctx.db, article.id),
		audit.ofSubject(ctx.db, 'article', article.id, 40),
		filing.wasAuthor(ctx.db, article.id, ctx.actor.id),
		templateInUse(ctx.db, article.template),
		checks.ofArticle(ctx.db, article.id)
	]);
	const subject = { authorId: article.authorId };
	const mayResolve = may(ctx.actor, 'article.resolve', subject);
	return done({
		article,
		kind: template?.name ?? kindOf(article.template),
		authorName,
		isOwn: article.authorId === ctx.actor.id,
		campaigns: bound.map(({ slug: name, name: title }) => ({ slug: name, name: title })),
		shown,
		comments: said.map((one) => ({ ...one, mayResolve: mayResolve || one.authorId === ctx.actor.id })),
		editions: printed,
		corrections: corrected,
		history: history.map(({ id, at, act, actorName, reason }) => ({ id, at, act, actorName, reason })),
		checklist: (template?.checklist ?? []).map((item) => ({
			...item,
			ticked: ticked.find((one) => one.group === item.group && one.item === item.text) ?? null
		})),
		mayCheck: may(ctx.actor, 'article.check'),
		moves: movesFor(
			ctx.actor,
			{ stage: article.stage, hasPage: hasPage(article) },
			article.authorId,
			handedItOn
		),
		mayComment: may(ctx.actor, 'article.comment'),
		mayPlan: may(ctx.actor, 'article.schedule'),
		mayCorrect: may(ctx.actor, 'article.correct'),
		hasPage: hasPage(article)
	});
}
