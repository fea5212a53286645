import { z } from 'zod';
import { settingQuantities } from '../domain/bench/words';
import { partKinds } from '../domain/stores/words';
import { line, number, unchosen, versionSeen } from './fields';
import { apiListing } from './listing';

const limitFields = {
	quantity: z
		.enum(settingQuantities, 'Say what is limited.')
		.refine((quantity) => quantity !== 'other', 'A limit needs a quantity that is understood.'),
	partKind: z.enum(partKinds, 'Say of which kind of part.'),
	limit: number({ min: 0, max: 1_000_000, decimals: 6, open: true }),
	unit: line(20).min(1, 'Say in which unit, such as V.'),
	/** Why this much. */
	source: line(300).min(1, 'Say where the limit is taken from: others will rely on it.')
};

/** The lab's own limit of a quantity on a kind of part, over which a profile is warned of. */
export const labLimitInput = z.object(limitFields);
export type LabLimitInput = z.output<typeof labLimitInput>;
export type LabLimitTyped = z.input<typeof labLimitInput>;

export const labLimitEdit = z.object({ ...limitFields, version: versionSeen });
export type LabLimitEdit = z.output<typeof labLimitEdit>;
export type LabLimitEditTyped = z.input<typeof labLimitEdit>;

export const labLimitRemove = z.object({ version: versionSeen });
export type LabLimitRemove = z.output<typeof labLimitRemove>;

export const blankLabLimit = (): LabLimitTyped => ({
	quantity: unchosen(),
	partKind: unchosen(),
	limit: '',
	unit: '',
	source: ''
});

export const limitsApiQuery = apiListing.extend({
	quantity: z.enum(settingQuantities).optional(),
	partKind: z.enum(partKinds).optional()
});
export type LimitsApiQuery = z.output<typeof limitsApiQuery>;
