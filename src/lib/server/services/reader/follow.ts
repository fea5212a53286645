import type { Feed } from '../../../domain/reader/atom';
import type { SitemapPage } from '../../../domain/reader/sitemap';
import type { OpenContext } from '../../context';
import * as published from '../../db/queries/published';
import { publication } from '../../db/queries/settings';

/** What readers follow: the thirty newest articles with their dates; a new edition counts as a change of its article. */
export async function feedOf(ctx: OpenContext): Promise<Feed> {
	const [{ name, tagline }, rows] = await Promise.all([
		publication(ctx.db),
		published.articles(ctx.db, { limit: 30, offset: 0 })
	]);
	const host = new URL(ctx.origin).hostname;
	return {
		id: `tag:${host},2026:feed`,
		title: name,
		subtitle: tagline,
		home: `${ctx.origin}/`,
		self: `${ctx.origin}/feed.atom`,
		now: ctx.now,
		entries: rows.map((row) => {
			const first = row.firstPublishedAt ?? ctx.now;
			return {
				id: `tag:${host},2026:articles/${row.slug}`,
				title: row.title,
				href: `${ctx.origin}/articles/${row.slug}`,
				author: row.authorName,
				published: first,
				updated: row.publishedAt ?? first,
				summary: row.standfirst
			};
		})
	};
}

const standing = ['/', '/parts', '/methods', '/how-we-test', '/about', '/corrections'];

/** Every page readers can reach. */
export async function sitemapOf(ctx: OpenContext): Promise<SitemapPage[]> {
	const [articles, parts, methods] = await Promise.all([
		published.articles(ctx.db, { limit: 20_000, offset: 0 }),
		published.parts(ctx.db),
		published.methods(ctx.db)
	]);
	return [
		...standing.map((path) => ({ href: `${ctx.origin}${path}` })),
		...articles.map((row) => ({ href: `${ctx.origin}/articles/${row.slug}`, changed: row.publishedAt })),
		...parts.map((row) => ({ href: `${ctx.origin}/parts/${row.slug}` })),
		...methods.map((row) => ({ href: `${ctx.origin}/methods/${row.slug}` }))
	];
}
