import { z } from 'zod';
import { settingQuantities } from '../domain/bench/words';
import { settingNumber } from '../domain/bench/tuning/setting-number';
import { partKinds } from '../domain/stores/words';
import { line, number, versionSeen } from './fields';

/** What it sets; 'other' would say nothing. */
const quantity = z
	.enum(settingQuantities, 'Choose what it sets.')
	.refine((chosen) => chosen !== 'other', 'Choose what it sets.');

/** What a family of firmware calls a setting, and what that means. */
export const meaningInput = z.object({
	family: line(80).min(1, 'Name the family of firmware.'),
	setting: line(160).min(1, 'Name the setting as the firmware does.'),
	quantity,
	/** Chiplet or core group; 0 for all. */
	coreGroup: number({ min: 0, max: 64, decimals: 0 }).default(0)
});
export type MeaningInput = z.output<typeof meaningInput>;

export const meaningEdit = meaningInput.extend({ version: versionSeen });
export type MeaningEdit = z.output<typeof meaningEdit>;

const limitFields = z.object({
	quantity,
	partKind: z.enum(partKinds, 'Choose the kind of part, or other for every rig.'),
	limit: number({ min: 0, max: 1_000_000, decimals: 4, open: true }),
	unit: line(20).default(''),
	source: line(300).min(1, 'Say why this much: the maker’s data sheet, or what the lab has seen.')
});

/** A limit can only be held against settings in a unit that its quantity is written in. */
const unitFits = (row: z.output<typeof limitFields>, ctx: z.core.$RefinementCtx): void => {
	if (settingNumber(row.quantity, String(row.limit), row.unit)) return;
	ctx.addIssue({
		code: 'custom',
		path: ['unit'],
		message: 'Give a unit that this is set in, such as V for a voltage or W for power.'
	});
};

/** A row of the lab's own limits table. */
export const limitInput = limitFields.superRefine(unitFits);
export type LimitInput = z.output<typeof limitInput>;

export const limitEdit = limitFields.extend({ version: versionSeen }).superRefine(unitFits);
export type LimitEdit = z.output<typeof limitEdit>;
