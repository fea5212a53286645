import { DateTime } from 'luxon';
import { booleanQuery, snippetOf, wantedOf, type SnippetPart } from '../../../domain/articles/search-words';
import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse } from '../../../domain/shared/outcome';
import type { ArticlesQuery } from '../../../schemas/article-list';
import { paged, pageSize } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article-list';
import type { ArticleFilter } from '../../db/queries/article-list';
import * as views from '../../db/queries/desk-view';
import * as settings from '../../db/queries/settings';

/** The filter of an address, its days read in the publication's zone, its words as the database looks for them. */
function filterOf(query: ArticlesQuery, zone: string): ArticleFilter {
	const dayOf = (text: string) => DateTime.fromISO(text, { zone });
	const words = booleanQuery(wantedOf(query.q));
	return {
		stage: query.stage || undefined,
		writer: query.writer || undefined,
		campaign: query.campaign || undefined,
		tag: query.tag || undefined,
		from: query.from ? dayOf(query.from).toJSDate() : undefined,
		before: query.to ? dayOf(query.to).plus({ days: 1 }).toJSDate() : undefined,
		words: words ?? undefined,
		// Words too short for the index are looked for in titles.
		title: words === null && query.q !== '' ? query.q : undefined
	};
}

/** All articles, of any stage, as a filter asks; with where the words looked for stand. A fixed number of queries. */
export async function listArticles(ctx: Context, query: ArticlesQuery) {
	if (!may(ctx.actor, 'article.read'))
		return refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
	const { db, actor } = ctx;
	const { zone } = await settings.publication(db);
	const filter = filterOf(query, zone);
	const order = { sort: query.sort, way: query.way, limit: pageSize, offset: (query.page - 1) * pageSize };
	const edits = may(actor, 'article.publish');
	const [rows, total, tags, campaigns, writers, seen, takers] = await Promise.all([
		articles.list(db, filter, order),
		articles.total(db, filter),
		articles.tagCounts(db),
		articles.boundCampaigns(db),
		articles.writers(db),
		views.list(db, actor.id),
		edits ? articles.canWrite(db) : []
	]);
	const ids = rows.map((row) => row.id);
	const [filed, texts] = await Promise.all([
		articles.tagsOf(db, ids),
		filter.words ? articles.textsOf(db, ids) : []
	]);
	const tagsOf = grouped(filed, (one) => one.articleId);
	const wanted = wantedOf(query.q);
	const found = new Map<number, SnippetPart[] | null>(
		texts.map((one) => [one.articleId, snippetOf(one.source, wanted) ?? snippetOf(one.standfirst, wanted)])
	);
	return done({
		...paged(
			rows.map((row) => ({
				...row,
				tags: (tagsOf.get(row.id) ?? []).map((one) => one.tag),
				snippet: found.get(row.id) ?? null,
				mayFile: may(actor, 'article.edit', { authorId: row.authorId })
			})),
			total,
			query.page
		),
		tags,
		campaigns,
		writers,
		takers: takers.map(({ id, name }) => ({ id, name })),
		views: seen.map((view) => ({ ...view, own: view.ownerId === actor.id })),
		zone
	});
}
