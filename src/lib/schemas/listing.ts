import { z } from 'zod';

/** Rows of one page of a list. */
export const pageSize = 50;

const direction = z.enum(['up', 'down']);

/** What every list takes from its address: words to look for, a sort with its direction, a page. */
export const listing = <const S extends readonly [string, ...string[]]>(
	sorts: S,
	way: 'up' | 'down' = 'up'
) =>
	z.object({
		q: z.string().trim().max(200, 'Look for at most 200 characters.').default(''),
		sort: z.enum(sorts).default(sorts[0] as never),
		way: direction.default(way),
		page: z.coerce.number('A page is a number.').int().min(1).max(100_000).default(1)
	});

export interface Paged<T> {
	rows: T[];
	total: number;
	page: number;
	pages: number;
}

/** One page of a list with what a pager needs. */
export const paged = <T>(rows: T[], total: number, page: number): Paged<T> => ({
	rows,
	total,
	page,
	pages: Math.max(1, Math.ceil(total / pageSize))
});

/**
 * A list's state from an address; what cannot be read there falls back to its default, so that no old link breaks a page.
 * @example readListing(partsQuery, url.searchParams)
 */
export function readListing<S extends z.ZodObject>(schema: S, params: URLSearchParams): z.output<S> {
	const given = Object.fromEntries([...params].filter(([key, value]) => key in schema.shape && value !== ''));
	const parsed = schema.safeParse(given);
	if (parsed.success) return parsed.data;
	for (const issue of parsed.error.issues) delete given[String(issue.path[0])];
	return schema.parse(given);
}

/** What a list of the API takes from its address: words to look for, and a cursor instead of a page. */
export const apiListing = z.object({
	q: z
		.string()
		.trim()
		.max(200, 'Look for at most 200 characters.')
		.default('')
		.describe('Words to look for.'),
	limit: z.coerce.number('Give a whole number.').int('Give a whole number.').min(1).max(200).default(50),
	after: z.coerce
		.number('Pass `next` of the page before.')
		.int('Pass `next` of the page before.')
		.positive('Pass `next` of the page before.')
		.optional()
		.describe('`next` of the page before.')
});
