import { z } from 'zod';
import { checklistOfLines } from '../domain/articles/template';
import { line, optionalSlug, paragraphs } from './fields';

/** Longest text of a template, in characters. */
const longestBody = 60_000;

const templateFields = {
	name: line(80).min(1, 'A template needs a name.'),
	title: line(200).min(3, 'Write what a title of this kind looks like.'),
	standfirst: line(500).default(''),
	for: line(300).min(3, 'Say in a sentence what it is for.'),
	body: z
		.string('Write text here.')
		.max(longestBody, 'Keep it to 60,000 characters.')
		.transform((text) => text.replace(/\r\n?/g, '\n'))
		.refine((text) => text.trim() !== '', 'A template begins an article: write at least a line.'),
	/** A line each: `data: …`, `prose: …`, `pictures: …` or `law: …`. */
	checklist: paragraphs(12_000)
		.default('')
		.superRefine((text, ctx) => {
			const { items, faults } = checklistOfLines(text.replace(/\r\n?/g, '\n'));
			for (const message of faults) ctx.addIssue({ code: 'custom', message });
			if (items.length > 60) ctx.addIssue({ code: 'custom', message: 'Keep it to 60 items.' });
		})
		.transform((text) => checklistOfLines(text.replace(/\r\n?/g, '\n')).items)
};

/** A template of the lab's own. */
export const templateInput = z.object({ ...templateFields, kind: optionalSlug });
export type TemplateInput = z.output<typeof templateInput>;

/** A change of a template; 0 is the version of what ships and nobody changed yet. */
export const templateEdit = z.object({
	...templateFields,
	version: z.coerce.number('The page is incomplete: load it again.').int().min(0)
});
export type TemplateEdit = z.output<typeof templateEdit>;
export type TemplateTyped = z.input<typeof templateEdit>;

export const templateVersion = z.object({
	version: z.coerce.number('The page is incomplete: load it again.').int().min(0)
});
export const templateRetire = templateVersion.extend({ retired: z.enum(['yes', 'no']) });
export type TemplateRetire = z.output<typeof templateRetire>;

export const blankTemplate = (): z.input<typeof templateInput> => ({
	name: '',
	kind: '',
	title: '',
	standfirst: '',
	for: '',
	body: '*Say what you found in the first sentence.*\n\n{{#campaigns}}\n::plate{kind=gains over={{baseline}}{{of}}}\n\n{{/campaigns}}\n::disclosure\n',
	checklist: 'data: Every cell the article shows is signed off.'
});

/** Which campaign a template is shown with; none for that of the article printed last. */
export const previewChoice = z.object({ campaign: z.string().max(80).catch('').default('') });

/** One item of a checklist, ticked or taken back. */
export const checkInput = z.object({
	group: z.enum(['data', 'prose', 'pictures', 'law']),
	item: z.string().min(1).max(200),
	checked: z.enum(['yes', 'no'])
});
export type CheckInput = z.output<typeof checkInput>;
