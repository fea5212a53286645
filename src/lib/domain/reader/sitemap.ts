import { escapeHtml } from '../mail/letter';

export interface SitemapPage {
	href: string;
	/** When it last changed, where that is known. */
	changed?: Date | null;
}

/** A sitemap (the Sitemaps protocol 0.9, at most 50,000 pages). @throws RangeError for more pages than the protocol allows */
export function sitemap(pages: SitemapPage[]): string {
	if (pages.length > 50_000) throw new RangeError('A sitemap holds at most 50,000 pages.');
	const rows = pages.map(
		({ href, changed }) =>
			`<url><loc>${escapeHtml(href)}</loc>${changed ? `<lastmod>${changed.toISOString()}</lastmod>` : ''}</url>`
	);
	return `<?xml version="1.0" encoding="UTF-8"?>\n<urlset xmlns="http://www.sitemaps.org/schemas/sitemap/0.9">\n${rows.join('\n')}\n</urlset>\n`;
}
