import { z } from 'zod';

/** The largest file an article is imported from. */
export const articleFileLimitBytes = 60_000_000;

const file = z
	.instanceof(File, { message: 'Choose a file.' })
	.refine((sent) => sent.size > 0, 'Choose a file.')
	.refine((sent) => sent.size <= articleFileLimitBytes, 'The file is larger than 60 MB.');
const keepMissing = z.stringbool().default(false);

export const articleImport = z.object({
	file,
	title: z.string().trim().max(200, 'Keep the title to 200 characters.').default(''),
	campaigns: z.array(z.string().min(1)).max(12, 'An article can use twelve campaigns at most.').default([]),
	keepMissing
});

export const revisionImport = z.object({
	file,
	keepMissing,
	basedOn: z.coerce.number('The page is incomplete: load it again.').int().min(1)
});
