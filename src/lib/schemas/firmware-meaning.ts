import { z } from 'zod';
import { settingQuantities } from '../domain/bench/words';
import { line, number, unchosen, versionSeen } from './fields';
import { apiListing } from './listing';

const meaningFields = {
	/** The firmware family as the lab calls it, whatever the version. */
	family: line(80).min(1, 'Name the firmware family.'),
	setting: line(160).min(1, 'Write the setting as the firmware calls it.'),
	quantity: z
		.enum(settingQuantities, 'Say what it sets.')
		.refine((quantity) => quantity !== 'other', 'Say what it sets; what is not understood needs no line.'),
	/** Chiplet or core group; 0 for all. */
	coreGroup: number({ min: 0, max: 64, decimals: 0 }).default(0)
};

/** What a firmware family calls a setting, and what that sets. */
export const meaningInput = z.object(meaningFields);
export type MeaningInput = z.output<typeof meaningInput>;
export type MeaningTyped = z.input<typeof meaningInput>;

export const meaningEdit = z.object({ ...meaningFields, version: versionSeen });
export type MeaningEdit = z.output<typeof meaningEdit>;
export type MeaningEditTyped = z.input<typeof meaningEdit>;

export const meaningRemove = z.object({ version: versionSeen });
export type MeaningRemove = z.output<typeof meaningRemove>;

/** What the list takes from its address. */
export const meaningsQuery = z.object({
	family: z.string().trim().max(80).catch('').default('')
});

/** A line to fill in, with what its address says already. */
export const blankMeaning = (asked: URLSearchParams = new URLSearchParams()): MeaningTyped => ({
	family: asked.get('family')?.slice(0, 80) ?? '',
	setting: asked.get('setting')?.slice(0, 160) ?? '',
	quantity: settingQuantities.find((one) => one === asked.get('quantity')) ?? unchosen(),
	coreGroup: '0'
});

export const meaningsApiQuery = apiListing.extend({
	family: z.string().trim().max(80).optional().describe('Of one firmware family.')
});
export type MeaningsApiQuery = z.output<typeof meaningsApiQuery>;
