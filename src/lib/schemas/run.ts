import { z } from 'zod';
import { isReading } from '../domain/bench/numbers';
import { line, paragraphs, reference, versionSeen } from './fields';

/** Readings that one run may carry. */
export const readingsPerRun = 1000;

const finite = z
	.number('Each reading must be a finite number.')
	.refine(
		isReading,
		'A reading is at most 1e15 in size: this is larger than anything a bench measures, or too small to be told from zero.'
	);

const ambientC = z
	.number('The ambient temperature is a number, in °C.')
	.min(-60, 'The ambient temperature is between −60 and 100 °C.')
	.max(100, 'The ambient temperature is between −60 and 100 °C.')
	.nullable()
	.default(null);

const startedAt = z.iso
	.datetime({ offset: true, error: 'Write the time with its offset, such as 2026-11-11T09:30:00Z.' })
	.transform((text) => new Date(text))
	.nullable()
	.default(null);

const unit = z.string('Say in which unit the readings are.').trim().max(40, 'Keep it to 40 characters.');
/** Local time in the publication's zone, as the browser's field gives it; empty for none. */
const localTime = z.string().trim().max(40).default('');
const notes = paragraphs(5000).default('');

/** A key that a client makes and repeats when it sends the same thing again. */
const key = z.string().regex(/^[\w-]{8,60}$/, 'A key has 8 to 60 letters, figures, hyphens or underscores.');

const list = <T extends z.ZodType>(item: T) =>
	z
		.array(item, 'Send the readings as a list of numbers.')
		.max(readingsPerRun, `A run has at most ${readingsPerRun} readings. Send the rest as another run.`);

/** A run as a script on the bench sends it. */
export const runInput = z.object({
	workload: reference('Name the workload by its slug or id.'),
	profile: reference('Name the profile by its slug or id.'),
	readings: list(finite).min(1, 'A run has at least one reading.'),
	unit,
	ambientC,
	startedAt,
	notes
});
export type RunInput = z.output<typeof runInput>;

/** Readings as the entry grid sends them: one run per sitting, each reading with its own key. */
export const gridInput = z.object({
	workload: reference('Name the workload.'),
	profile: reference('Name the profile.'),
	unit,
	runKey: key,
	ambientC,
	startedAt,
	/** Local time in the publication's zone, as typed; it goes before `startedAt`. */
	started: localTime,
	notes,
	/**
	 * Counted readings of others in this cell that the sender had seen; readings that would take the cell beyond its
	 * need over newer ones are held. Null sends them without asking.
	 */
	othersSeen: z.int().min(0).nullable().default(null),
	/** Empty to bring only the circumstances up to date. */
	readings: list(z.object({ key, value: finite }))
});
export type GridInput = z.output<typeof gridInput>;
export type GridSent = z.input<typeof gridInput>;

/** Most characters of a pasted block or of the plain form. */
export const plainReadingsLimit = 100_000;

/** Readings as the plain form sends them: one a line. */
export const plainRun = z.object({
	workload: reference('Name the workload.'),
	profile: reference('Name the profile.'),
	unit,
	runKey: key,
	readings: z
		.string('Write one reading a line.')
		.max(plainReadingsLimit, 'That is too much for one run. Nothing was entered; paste a smaller block.'),
	ambient: z.string().trim().max(40).default(''),
	/** Empty for now. */
	started: localTime,
	notes
});
export type PlainRun = z.output<typeof plainRun>;

/** A run's circumstances, corrected. */
export const runEdit = z.object({
	run: z.coerce.number().int().positive(),
	version: versionSeen,
	ambient: z.string().trim().max(40).default(''),
	started: localTime,
	notes
});
export type RunEdit = z.output<typeof runEdit>;

const reason = line(500).min(1, 'Say why: the reason stays in the history.');

export const runVoid = z.object({ run: z.coerce.number().int().positive(), reason });
export type RunVoid = z.output<typeof runVoid>;

/** Takes a reading out of the figures, or back into them. */
export const readingCount = z.object({ reading: z.coerce.number().int().positive(), reason });
export type ReadingCount = z.output<typeof readingCount>;

/** Cells to sign: one, or with neither named all that are complete and unsigned. */
export const cellSign = z.object({
	profile: z.string().trim().default(''),
	workload: z.string().trim().default('')
});
export type CellSign = z.output<typeof cellSign>;

export const cellUnsign = z.object({
	profile: reference('Name the profile.'),
	workload: reference('Name the workload.'),
	reason
});
export type CellUnsign = z.output<typeof cellUnsign>;

/** Chosen cells of the board, a line each as profile/workload: what its ticked boxes send. */
const chosenCells = z
	.string('Choose at least one cell.')
	.transform((text) =>
		[...new Set(text.split('\n'))].flatMap((row) => {
			const [profile = '', workload = ''] = row.trim().split('/');
			return profile === '' ? [] : [{ profile, workload }];
		})
	)
	.refine((cells) => cells.length > 0, 'Choose at least one cell.')
	.refine((cells) => cells.length <= 3600, 'Choose at most 3600 cells.');

export const chosenSign = z.object({ cell: chosenCells });
export type ChosenSign = z.output<typeof chosenSign>;

export const chosenUnsign = z.object({ cell: chosenCells, reason });
export type ChosenUnsign = z.output<typeof chosenUnsign>;
