import { z } from 'zod';

/** Longest source a revision may have, in characters: far past a long guide, well under the column. */
export const sourceMaxLength = 400_000;

/** Correction kinds an editor may choose; a withdrawal makes its own. */
export const correctionChoices = ['correction', 'clarification', 'update'] as const;
export type CorrectionChoice = (typeof correctionChoices)[number];

const title = z
	.string()
	.trim()
	.min(3, 'A title needs at least three characters.')
	.max(200, 'Keep the title to 200 characters.');
const standfirst = z.string().trim().max(500, 'Keep the standfirst to 500 characters.').default('');
const version = z.coerce.number('The version is not a number.').int().min(1);
const revisionNumber = z.coerce.number('The revision is not a number.').int().min(1);
const campaigns = z
	.array(z.string().min(1))
	.min(1, 'Choose at least one campaign: its numbers are what the article may print.')
	.max(12, 'An article can use twelve campaigns at most.');
const words = (missing: string) =>
	z.string().trim().min(3, missing).max(4000, 'Keep it to 4,000 characters.');

export const articleStart = z.object({
	title,
	template: z.string().min(1, 'Choose what kind of article it is.'),
	campaigns
});
export type ArticleStart = z.output<typeof articleStart>;

export const revisionSave = z.object({
	title,
	standfirst,
	// A form sends line ends as CR LF; what is stored and compared has one kind.
	source: z
		.string()
		.max(sourceMaxLength, 'The text is longer than 400,000 characters.')
		.default('')
		.transform((text) => text.replace(/\r\n?/g, '\n')),
	/** The revision the text was written on. */
	basedOn: revisionNumber
});
export type RevisionSave = z.output<typeof revisionSave>;

export const revisionRestore = z.object({ number: revisionNumber, basedOn: revisionNumber });
export type RevisionRestore = z.output<typeof revisionRestore>;

/** A name to find a revision by; empty takes it away. */
export const revisionName = z.object({
	number: revisionNumber,
	label: z.string().trim().max(80, 'Keep the name to 80 characters.').default('')
});
export type RevisionName = z.output<typeof revisionName>;

/** One of two texts that are compared: a revision by its number, or an edition as `e` and its number. */
export interface Side {
	kind: 'revision' | 'edition';
	number: number;
}
const side = z
	.string()
	.regex(/^e?[1-9]\d{0,8}$/)
	.transform((text): Side => ({
		kind: text.startsWith('e') ? 'edition' : 'revision',
		number: Number(text.replace('e', ''))
	}))
	.nullable()
	.default(null);

/** Which revisions to list and which two to compare; the newest and the one before it when left out. */
export const revisionsQuery = z.object({
	page: z.coerce.number().int().min(1).max(10_000).default(1),
	from: side,
	to: side,
	view: z.enum(['page', 'source']).default('page'),
	/** Unchanged parts of the page too. */
	all: z.stringbool().default(false),
	named: z.stringbool().default(false),
	q: z.string().trim().max(80).default('')
});
export type RevisionsQuery = z.output<typeof revisionsQuery>;

/** What an open editor says of its person. */
export const presenceSaid = z.object({
	/** Null while they only look. */
	lastKeyAgoS: z.number().int().min(0).max(1_000_000).nullable().default(null),
	leaving: z.boolean().default(false)
});
export type PresenceSaid = z.output<typeof presenceSaid>;

export const campaignsChoice = z.object({ version, campaigns });
export type CampaignsChoice = z.output<typeof campaignsChoice>;

export const commentInput = z.object({
	/** The passage as it reads on the page; empty for the article as a whole. */
	quote: z.string().trim().max(1000, 'Choose a shorter passage.').default(''),
	body: words('Write what you want to say.'),
	blocking: z.stringbool().default(false),
	parent: z.coerce.number().int().min(1).nullable().default(null)
});
export type CommentInput = z.output<typeof commentInput>;

export const commentResolve = z.object({
	comment: z.coerce.number().int().min(1),
	resolved: z.stringbool().default(true)
});
export type CommentResolve = z.output<typeof commentResolve>;

/** A move that needs nothing but the version it was decided on. */
export const plainMove = z.object({ version });
export type PlainMove = z.output<typeof plainMove>;

export const changesAsk = z.object({ version, words: words('Say what you want changed.') });
export type ChangesAsk = z.output<typeof changesAsk>;

export const slotChoice = z.object({
	version,
	/** Local date and time in the publication's zone; empty gives the slot up. */
	slot: z.union([
		z.literal(''),
		z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/, 'Write the date and the time of the slot.')
	])
});
export type SlotChoice = z.output<typeof slotChoice>;

export const correctionInput = z.object({
	version,
	kind: z.enum(correctionChoices, 'Choose what kind of change it is.'),
	body: words('Write what readers will be told.')
});
export type CorrectionInput = z.output<typeof correctionInput>;

export const withdrawal = z.object({
	version,
	reason: words('Write the reason: readers will see it in place of the article.')
});
export type Withdrawal = z.output<typeof withdrawal>;

export const deskFilter = z.object({
	stage: z.string().default(''),
	mine: z.stringbool().catch(false).default(false),
	q: z.string().trim().max(100).catch('').default(''),
	sort: z.enum(['slot', 'title', 'writer', 'changed']).catch('slot').default('slot'),
	page: z.coerce.number().int().min(1).max(10_000).catch(1).default(1)
});
export type DeskFilter = z.output<typeof deskFilter>;
