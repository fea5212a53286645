import { z } from 'zod';
import { parseReading } from '../domain/bench/numbers';
import { checkSweep } from '../domain/bench/stability/thread-sweep';
import { attemptOutcomes } from '../domain/bench/stability/words';
import { line, paragraphs, reference } from './fields';

interface Bounds {
	/** What it is, to begin a sentence with. */
	what: string;
	unit: string;
	min: number;
	max: number;
	decimals?: number;
	example: string;
}

const grouped = new Intl.NumberFormat('en');

const rangeWords = ({ what, unit, min, max, example }: Bounds) =>
	`${what} is from ${grouped.format(min)} to ${grouped.format(max)}${unit && ` ${unit}`}, such as ${example}.`;

/** What is wrong with a number as typed or sent; its value where nothing is. */
function read(typed: string | number, bounds: Bounds): { value: number } | { message: string } {
	const parsed = parseReading(String(typed));
	if (!parsed.ok) return { message: parsed.message };
	if (parsed.value < bounds.min || parsed.value > bounds.max) return { message: rangeWords(bounds) };
	const { decimals } = bounds;
	if (decimals === undefined || Number(parsed.value.toFixed(decimals)) === parsed.value) return parsed;
	return { message: decimals === 0 ? 'Write a whole number.' : `Write at most ${decimals} decimals.` };
}

/** A measured number, typed with a decimal point or comma, or sent as JSON. */
const measured = (bounds: Bounds) =>
	z.union([z.number(), z.string()], rangeWords(bounds)).transform((typed, ctx): number => {
		const result = read(typed, bounds);
		if ('value' in result) return result.value;
		ctx.addIssue({ code: 'custom', message: result.message });
		return z.NEVER;
	});

/** The same, left empty where it was not measured. */
const measuredIfAny = (bounds: Bounds) =>
	z
		.union([z.number(), z.string()], rangeWords(bounds))
		.nullable()
		.default(null)
		.transform((typed, ctx): number | null => {
			if (typed === null || String(typed).trim() === '') return null;
			const result = read(typed, bounds);
			if ('value' in result) return result.value;
			ctx.addIssue({ code: 'custom', message: result.message });
			return z.NEVER;
		});

const ambientC = measuredIfAny({
	what: 'The ambient temperature',
	unit: '°C',
	min: -60,
	max: 100,
	example: '21.5'
});

/** When it began; empty for now. */
const startedAt = z.iso
	.datetime({ offset: true, error: 'Write the time with its offset, such as 2026-11-11T09:30:00Z.' })
	.transform((text) => new Date(text))
	.nullable()
	.default(null);

/** A key that a client makes and repeats when it sends the same thing again. */
const key = z
	.string()
	.regex(/^[\w-]{8,60}$/, 'A key has 8 to 60 letters, figures, hyphens or underscores.')
	.nullable()
	.default(null);

const notes = paragraphs(1000).default('');

/** One attempt of a ladder; which kind of load its stress is, the ladder says. */
export const attemptInput = z
	.object({
		stress: reference('Name the stress by its slug or id.'),
		clockMHz: measured({ what: 'The clock', unit: 'MHz', min: 100, max: 12_000, example: '4900' }),
		volts: measured({
			what: 'The core voltage',
			unit: 'V',
			min: 0.3,
			max: 2.5,
			decimals: 4,
			example: '1.25'
		}),
		durationMin: measured({ what: 'The time it ran', unit: 'min', min: 0, max: 100_000, example: '30' }),
		outcome: z.enum(attemptOutcomes, 'Say whether it passed, failed or was stopped.'),
		/** What was seen when it failed. */
		failure: line(200).default(''),
		errors: measured({
			what: 'The count of errors',
			unit: '',
			min: 0,
			max: 1_000_000_000,
			decimals: 0,
			example: '3'
		}).default(0),
		peakTempC: measuredIfAny({
			what: 'The peak temperature',
			unit: '°C',
			min: -200,
			max: 150,
			example: '84'
		}),
		packageW: measuredIfAny({ what: 'The package power', unit: 'W', min: 0.1, max: 3000, example: '215' }),
		ambientC,
		startedAt,
		notes,
		key
	})
	.superRefine(({ outcome, failure, errors, durationMin }, ctx) => {
		const fault = (field: string, message: string) => {
			ctx.addIssue({ code: 'custom', path: [field], message });
		};
		if (outcome === 'failed' && failure === '')
			fault('failure', 'Say what was seen, such as crash or error.');
		if (outcome !== 'failed' && failure !== '')
			fault('failure', 'Only a failed attempt has a failure: clear it, or call the attempt failed.');
		if (outcome !== 'failed' && errors > 0)
			fault('errors', 'With errors counted, the attempt failed: call it failed, or write 0 errors.');
		if (outcome === 'passed' && durationMin === 0) fault('durationMin', 'Say for how long it passed.');
	});
export type AttemptInput = z.output<typeof attemptInput>;
export type AttemptTyped = z.input<typeof attemptInput>;

/** Attempts that one request may carry. */
export const attemptsPerRequest = 500;

/** Attempts as a script on the bench sends them. */
export const attemptsInput = z.object({
	attempts: z
		.array(attemptInput, 'Send the attempts as a list.')
		.min(1, 'Send at least one attempt.')
		.max(attemptsPerRequest, `Send at most ${attemptsPerRequest} attempts at once, and the rest after.`)
});
export type AttemptsInput = z.output<typeof attemptsInput>;

/** Loose here, for what is unlikely is asked about by `checkSweep`, not refused. */
const wide = { min: 0, max: 1e9 };

const point = z.object({
	threads: measured({
		what: 'The number of threads',
		unit: '',
		min: 1,
		max: 4096,
		decimals: 0,
		example: '8'
	}),
	currentA: measured({ what: 'The current', unit: 'A', ...wide, example: '112' }),
	clockMHz: measured({ what: 'The clock', unit: 'MHz', ...wide, example: '5325' })
});

/** Points that one pass may have. */
export const pointsPerPass = 256;

/** One pass of a sweep: threads rising, with the current and the clock at each. */
export const sweepPassInput = z
	.object({
		points: z
			.array(point, 'Send the points as a list.')
			.min(2, 'A pass has points at two thread counts or more.')
			.max(pointsPerPass, `A pass has at most ${pointsPerPass} points.`),
		/** Said by a person: what was asked about is as measured. */
		sure: z.boolean('Say true or false.').default(false),
		ambientC,
		startedAt,
		notes,
		key
	})
	.superRefine(({ points, sure }, ctx) => {
		if (new Set(points.map(({ currentA }) => currentA)).size < 2)
			ctx.addIssue({
				code: 'custom',
				path: ['points'],
				message: 'All points have the same current, so no switch point can be told. Check the currents.'
			});
		for (const finding of checkSweep(points)) {
			if (finding.kind === 'asked' && sure) continue;
			const message =
				finding.kind === 'asked' ? `${finding.message} If it is as measured, say so.` : finding.message;
			ctx.addIssue({
				code: 'custom',
				path: ['points', finding.row, finding.field],
				message,
				params: { asked: finding.kind === 'asked', meant: finding.meant }
			});
		}
	});
export type SweepPassInput = z.output<typeof sweepPassInput>;
export type SweepPassTyped = z.input<typeof sweepPassInput>;

/** A sweep driven through several times, as a script on the bench sends it. */
export const sweepInput = z.object({
	passes: z
		.array(sweepPassInput, 'Send the passes as a list.')
		.min(1, 'Send at least one pass.')
		.max(50, 'Send at most 50 passes at once, and the rest after.')
});
export type SweepInput = z.output<typeof sweepInput>;
