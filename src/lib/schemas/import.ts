import { z } from 'zod';

/** Longest file of readings that one import takes, in bytes. */
export const importLimitBytes = 1_900_000;

export const importLimitWords = '1.9 MB';

export const importInput = z.object({
	text: z.string().refine((text) => text.trim() !== '', 'Choose a file or paste its text.'),
	/** Take the good rows and leave the refused ones; only with this said is less than everything taken. */
	leaveRefused: z.boolean().default(false)
});
export type ImportInput = z.output<typeof importInput>;

/** The import form as sent: a chosen file goes before pasted text. */
export async function readImportForm(posted: FormData): Promise<z.input<typeof importInput>> {
	const file = posted.get('file');
	const pasted = posted.get('text');
	const text = file instanceof File && file.size > 0 ? await file.text() : pasted;
	return {
		text: typeof text === 'string' ? text : '',
		leaveRefused: posted.get('leaveRefused') === 'yes'
	};
}
