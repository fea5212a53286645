import { z } from 'zod';
import { json } from './api';

/** `?limit=` and `?after=`: a page is what follows the last item of the one before. */
export const pageQuery = z.object({
	limit: z.coerce.number('Give a whole number.').int('Give a whole number.').min(1).max(200).default(50),
	after: z.string().max(190).optional()
});
export type PageQuery = z.output<typeof pageQuery>;

/** The shape of a page, for the API's description. */
export const pageOf = <T extends z.ZodType>(item: T) =>
	z.object({
		items: z.array(item),
		next: z.string().nullable().describe('Pass it as `after` for the next page; null on the last.')
	});

/**
 * A page as a response, with the next one's address in `Link`. Ask the query for `limit + 1` rows: the one too many
 * says that there is more.
 * @example return page(event.url, rows, query.value, (row) => row.slug);
 */
export function page<T>(
	url: URL,
	rows: T[],
	{ limit }: PageQuery,
	cursorOf: (item: T) => string | number
): Response {
	const items = rows.slice(0, limit);
	const last = items.at(-1);
	const next = rows.length > limit && last !== undefined ? String(cursorOf(last)) : null;
	if (next === null) return json({ items, next });
	const onward = new URL(url);
	onward.searchParams.set('after', next);
	return json({ items, next }, { headers: { link: `<${onward.pathname}${onward.search}>; rel="next"` } });
}
