import { parse } from 'yaml';
import { z } from 'zod';
import { kindOf } from '../../domain/articles/kinds';
import { checklistGroups, type ArticleTemplate } from '../../domain/articles/template';

const items = z.array(z.string().min(1).max(200)).default([]);

const frontMatter = z.object({
	title: z.string().min(1),
	standfirst: z.string(),
	kind: z.string().regex(/^[a-z0-9-]+$/),
	for: z.string().min(1),
	/** What to look at before it goes out. */
	checklist: z.object({ data: items, prose: items, pictures: items, law: items })
});

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
		throw new Error(`${path} has no readable head (title, standfirst, kind, for, checklist).`);
	const { checklist, ...rest } = head.data;
	return {
		...rest,
		name: kindOf(rest.kind),
		body: match[2] ?? '',
		checklist: checklistGroups.flatMap((group) => checklist[group].map((item) => ({ group, text: item })))
	};
}

const order = ['tuning-guide', 'product-test', 'comparison', 'short-note'];
const placeOf = ({ kind }: ArticleTemplate): number => order.indexOf(kind) + 1 || order.length + 1;

/** The templates that ship, the usual ones first. The lab's own versions of them stand in the database. */
export const shippedTemplates: readonly ArticleTemplate[] = Object.entries(files)
	.map(([path, text]) => read(path, text))
	.sort((a, b) => placeOf(a) - placeOf(b) || a.kind.localeCompare(b.kind, 'en'));

/** A shipped template by its kind; undefined where there is none. */
export const shippedTemplate = (kind: string): ArticleTemplate | undefined =>
	shippedTemplates.find((template) => template.kind === kind);
