import { z } from 'zod';
import { line, number, optionalSlug, versionSeen } from './fields';
import { apiListing, listing } from './listing';

const day = z
	.string('Write a date such as 2026-11-20.')
	.trim()
	.default('')
	.refine((text) => text === '' || z.iso.date().safeParse(text).success, 'Write a date such as 2026-11-20.');

const share = number({ min: 0, max: 100, decimals: 5 }).default(0);
const amount = number({ min: 0, max: 1_000_000, decimals: 9 }).default(0);

const instrumentFields = {
	name: line(160).min(1, 'An instrument needs a name.'),
	serial: line(120).default(''),
	quantity: line(80).min(1, 'Say what it measures, such as power.'),
	unit: line(40).min(1, 'Say in which unit, such as W.'),
	/** Limits of error: ± this share of the reading in percent, plus ± this much in the unit. */
	accuracyPercent: share,
	accuracyAbsolute: amount,
	/** The last digit it shows, in the unit. */
	resolution: amount,
	/** ISO days; empty for none. */
	calibratedOn: day,
	calibrationDueOn: day,
	/** Where the accuracy is taken from. */
	accuracySource: line(200).default('')
};

interface Dates {
	calibratedOn: string;
	calibrationDueOn: string;
}

const inOrder = ({ calibratedOn, calibrationDueOn }: Dates) =>
	calibratedOn === '' || calibrationDueOn === '' || calibratedOn < calibrationDueOn;
const dueLater = {
	message: 'The next calibration is due after the last one.',
	path: ['calibrationDueOn']
};

/** What figures are read from, with its limits of error and its calibration. */
export const instrumentInput = z
	.object({ ...instrumentFields, slug: optionalSlug })
	.refine(inOrder, dueLater);
export type InstrumentInput = z.output<typeof instrumentInput>;
export type InstrumentTyped = z.input<typeof instrumentInput>;

export const instrumentEdit = z
	.object({ ...instrumentFields, version: versionSeen })
	.refine(inOrder, dueLater);
export type InstrumentEdit = z.output<typeof instrumentEdit>;
export type InstrumentEditTyped = z.input<typeof instrumentEdit>;

export const instrumentRetire = z.object({ retired: z.enum(['yes', 'no']), version: versionSeen });
export type InstrumentRetire = z.output<typeof instrumentRetire>;

export const blankInstrument = (): InstrumentTyped => ({
	name: '',
	slug: '',
	serial: '',
	quantity: '',
	unit: '',
	accuracyPercent: '0',
	accuracyAbsolute: '0',
	resolution: '0',
	calibratedOn: '',
	calibrationDueOn: '',
	accuracySource: ''
});

type Stored = Pick<InstrumentInput, 'name' | 'serial' | 'quantity' | 'unit' | 'accuracySource'> & {
	accuracyPercent: number;
	accuracyAbsolute: number;
	resolution: number;
	calibratedOn: string | null;
	calibrationDueOn: string | null;
};

/** A stored instrument as its form shows it. */
export const asTypedInstrument = (stored: Stored) => ({
	name: stored.name,
	serial: stored.serial,
	quantity: stored.quantity,
	unit: stored.unit,
	accuracyPercent: plain(stored.accuracyPercent),
	accuracyAbsolute: plain(stored.accuracyAbsolute),
	resolution: plain(stored.resolution),
	calibratedOn: stored.calibratedOn ?? '',
	calibrationDueOn: stored.calibrationDueOn ?? '',
	accuracySource: stored.accuracySource
});

/** A number without a power of ten, which the form does not take. */
const plain = (value: number): string => value.toFixed(9).replace(/\.?0+$/, '');

export const instrumentsQuery = listing(['name', 'due', 'newest']).extend({
	state: z.enum(['open', 'retired', 'all']).default('open')
});
export type InstrumentsQuery = z.output<typeof instrumentsQuery>;

export const instrumentsApiQuery = apiListing.extend({
	state: z.enum(['open', 'retired', 'all']).default('all')
});
export type InstrumentsApiQuery = z.output<typeof instrumentsApiQuery>;
