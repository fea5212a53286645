import { escapeHtml } from '../mail/letter';

export interface FeedEntry {
	/** Never changes and is never used again. */
	id: string;
	title: string;
	href: string;
	author: string;
	published: Date;
	updated: Date;
	summary: string;
}

export interface Feed {
	id: string;
	title: string;
	subtitle: string;
	/** The page the feed follows, and the feed's own address. */
	home: string;
	self: string;
	/** When there is no entry, the moment the feed is dated. */
	now: Date;
	entries: FeedEntry[];
}

// Characters that XML 1.0 does not allow at all, even escaped.
// eslint-disable-next-line no-control-regex -- these are the characters meant
const forbidden = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g;
const text = (value: string) => escapeHtml(value.replace(forbidden, ''));

/**
 * An Atom feed (RFC 4287). Dates are RFC 3339 with capital T and Z, as section 3.3 asks; each entry names its author.
 * @example atom({ id: 'tag:…', entries: [] , … })
 */
export function atom(feed: Feed): string {
	const updated = feed.entries.reduce(
		(latest, entry) => (entry.updated > latest ? entry.updated : latest),
		feed.entries[0]?.updated ?? feed.now
	);
	const entries = feed.entries.map(
		(entry) => `<entry>
<title>${text(entry.title)}</title>
<link rel="alternate" type="text/html" href="${text(entry.href)}"/>
<id>${text(entry.id)}</id>
<published>${entry.published.toISOString()}</published>
<updated>${entry.updated.toISOString()}</updated>
<author><name>${text(entry.author)}</name></author>
<summary>${text(entry.summary)}</summary>
</entry>`
	);
	return `<?xml version="1.0" encoding="utf-8"?>
<feed xmlns="http://www.w3.org/2005/Atom" xml:lang="en">
<title>${text(feed.title)}</title>
<subtitle>${text(feed.subtitle)}</subtitle>
<link rel="alternate" type="text/html" href="${text(feed.home)}"/>
<link rel="self" type="application/atom+xml" href="${text(feed.self)}"/>
<id>${text(feed.id)}</id>
<updated>${updated.toISOString()}</updated>
<generator>Calipress</generator>
${entries.join('\n')}
</feed>
`;
}
