import { z } from 'zod';
import { line, optionalSlug, paragraphs, versionSeen } from './fields';
import { listing } from './listing';

const aliases = line(400)
	.default('')
	.transform((text) => [
		...new Set(
			text
				.split(',')
				.map((word) => word.trim())
				.filter((word) => word !== '')
		)
	])
	.refine((words) => words.length <= 12, 'Twelve other words are enough.')
	.refine((words) => words.every((word) => word.length <= 60), 'Keep each word to 60 characters.')
	.refine((words) => words.every((word) => !/["{}]/.test(word)), 'Leave quotes and braces out of a word.');

const termFields = {
	term: line(120)
		.min(1, 'Write the word.')
		.refine((text) => !/["{}]/.test(text), 'Leave quotes and braces out of the word.'),
	/** Plain text: it stands at the end of an article and in a small box over the word. */
	explanation: paragraphs(600).min(10, 'Explain it in a sentence, in plain words.'),
	/** Other words it goes by, with commas between them. */
	aliases
};

/** A word of the trade with its explanation. */
export const termInput = z.object({ ...termFields, slug: optionalSlug });
export type TermInput = z.output<typeof termInput>;
export type TermTyped = z.input<typeof termInput>;

export const termEdit = z.object({ ...termFields, version: versionSeen });
export type TermEdit = z.output<typeof termEdit>;

export const termRetire = z.object({ retired: z.enum(['yes', 'no']), version: versionSeen });
export type TermRetire = z.output<typeof termRetire>;

export const blankTerm = (): TermTyped => ({ term: '', slug: '', explanation: '', aliases: '' });

export const termsQuery = listing(['term']).extend({
	state: z.enum(['open', 'retired', 'all']).default('open')
});
export type TermsQuery = z.output<typeof termsQuery>;
