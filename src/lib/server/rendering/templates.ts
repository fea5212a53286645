import { parse } from 'yaml';
import { z } from 'zod';

const frontMatter = z.object({
	/** What the title field holds at first. */
	title: z.string().min(1),
	standfirst: z.string(),
	/** The template's own name, which is also the kind of article it makes. */
	kind: z.string().regex(/^[a-z0-9-]+$/),
	/** What it is for, in a sentence for the writer. */
	for: z.string().min(1)
});

/** A template an article can begin from. */
export interface ArticleTemplate extends z.output<typeof frontMatter> {
	/** Its text, with names to be filled in (fillTemplate). */
	body: string;
}

// Read when the application is built, so that the templates ship inside it.
const files = import.meta.glob<string>('/content-templates/*.md', {
	query: '?raw',
	import: 'default',
	eager: true
});

function read(path: string, text: string): ArticleTemplate {
	const match = /^---\r?\n([\s\S]*?)\r?\n---\r?\n([\s\S]*)$/.exec(text);
	const head = frontMatter.safeParse(match ? parse(match[1] ?? '') : null);
	if (!match || !head.success)
		throw new Error(`${path} has no readable head (title, standfirst, kind, for).`);
	return { ...head.data, body: match[2] ?? '' };
}

const order = ['tuning-guide', 'product-test', 'comparison', 'short-note'];
const placeOf = ({ kind }: ArticleTemplate): number => order.indexOf(kind) + 1 || order.length + 1;

/** The templates an article can begin from, the usual ones first, then the lab's own by name. */
export const articleTemplates: readonly ArticleTemplate[] = Object.entries(files)
	.map(([path, text]) => read(path, text))
	.sort((a, b) => placeOf(a) - placeOf(b) || a.kind.localeCompare(b.kind, 'en'));

/** A template by its kind; undefined where there is none. */
export const templateOf = (kind: string): ArticleTemplate | undefined =>
	articleTemplates.find((template) => template.kind === kind);
