import { z } from 'zod';
import { stages } from '../domain/articles/stage';
import { listing } from './listing';

/** A tag is lower case, words with single spaces: "cpu tuning" and "CPU  Tuning" are one. */
export const tagName = z
	.string()
	.trim()
	.transform((text) => text.toLowerCase().replace(/\s+/g, ' '))
	.pipe(
		z
			.string()
			.min(1, 'Write a tag.')
			.max(40, 'Keep a tag to 40 characters.')
			.regex(/^[\p{L}\p{N}][\p{L}\p{N} .+-]*$/u, 'A tag is letters, figures, spaces, points, + and -.')
	);

const day = z.iso.date('Write the day as year-month-day.');

export const articleSorts = ['changed', 'title', 'writer', 'slot', 'printed'] as const;

/** What the article list takes from its address. */
export const articlesQuery = listing(articleSorts, 'down').extend({
	stage: z.enum(['', ...stages]).default(''),
	/** A person's id: the author. */
	writer: z.string().max(36).default(''),
	campaign: z.string().max(80).default(''),
	tag: z.string().max(40).default(''),
	/** Days in the publication's zone, the last change among them. */
	from: z.union([z.literal(''), day]).default(''),
	to: z.union([z.literal(''), day]).default('')
});
export type ArticlesQuery = z.output<typeof articlesQuery>;

/** Slugs as a list, or line by line, as the ticked boxes of a form come. */
const slugs = z
	.union([z.array(z.string()), z.string().transform((text) => text.split('\n'))])
	.transform((all) => all.map((one) => one.trim()).filter((one) => one !== ''))
	.pipe(z.array(z.string().max(80)))
	.refine((all) => all.length > 0, 'Tick at least one article.')
	.refine((all) => all.length <= 100, 'Tick at most a hundred articles at once.');

/** What may be done to several articles at once. */
export const articlesBulk = z.discriminatedUnion(
	'act',
	[
		z.object({ act: z.literal('tag'), slugs, tag: tagName }),
		z.object({ act: z.literal('untag'), slugs, tag: tagName }),
		z.object({ act: z.literal('hand-over'), slugs, person: z.string().min(1, 'Choose who takes them.') })
	],
	'Choose what to do with them.'
);
export type ArticlesBulk = z.output<typeof articlesBulk>;

export const viewSave = z.object({
	name: z.string().trim().min(1, 'Name the view.').max(60, 'Keep the name to 60 characters.'),
	query: z.string().max(1000, 'This filter is too long to keep.').default(''),
	shared: z.stringbool().default(false)
});
export type ViewSave = z.output<typeof viewSave>;

export const viewForget = z.object({ view: z.coerce.number('There is no such view.').int().min(1) });
export type ViewForget = z.output<typeof viewForget>;
