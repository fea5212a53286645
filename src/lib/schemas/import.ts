import { z } from 'zod';

/** Longest file of readings that one import takes, in bytes. */
export const importLimitBytes = 1_500_000;

export const importInput = z.object({
	text: z.string('Choose a file or paste its text.').min(1, 'Choose a file or paste its text.'),
	/** Take the good rows and leave the refused ones; only with this said is less than everything taken. */
	leaveRefused: z.boolean().default(false)
});
export type ImportInput = z.output<typeof importInput>;
