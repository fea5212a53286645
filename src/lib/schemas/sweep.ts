import { z } from 'zod';
import { passBlock } from '../domain/bench/stability/pass-block';
import { line, number, optionalSlug, paragraphs, reference, versionSeen } from './fields';
import { apiListing, listing } from './listing';
import { sweepPassInput, type SweepPassInput } from './stability';

const name = line(160).min(1, 'A sweep needs a name.');
const purpose = paragraphs(5000).default('');

const figures = {
	/** The fixed clock the board would change to, in MHz. */
	wantedClockMhz: number({ min: 100, max: 12_000, decimals: 3 }),
	/** The step in which the board takes the current, in A. */
	currentStepA: number({ min: 0, max: 100, decimals: 3, open: true })
};

/** A sweep: a rig as it stands now under automatic boost, one workload with rising threads, and the fixed clock wanted. */
export const sweepPlan = z.object({
	name,
	slug: optionalSlug,
	rig: reference('Choose a rig.'),
	profile: reference('Choose a profile.'),
	workload: reference('Choose a workload.'),
	purpose,
	...figures
});
export type SweepPlan = z.output<typeof sweepPlan>;
export type SweepPlanTyped = z.input<typeof sweepPlan>;

/** What may be said differently later; the points stay as they were measured. */
export const sweepEdit = z.object({ name, purpose, ...figures, version: versionSeen });
export type SweepEdit = z.output<typeof sweepEdit>;
export type SweepEditTyped = z.input<typeof sweepEdit>;

export const blankSweep = (rig: string, profile: string): SweepPlanTyped => ({
	name: '',
	slug: '',
	rig,
	profile,
	workload: '',
	purpose: '',
	wantedClockMhz: '',
	currentStepA: '1'
});

export const passVoid = z.object({
	pass: z.coerce.number().int().positive(),
	reason: line(500).min(1, 'Say why: the reason stays in the history.')
});
export type PassVoid = z.output<typeof passVoid>;

const state = z.enum(['open', 'archived', 'all']);
const rig = z.string().trim().max(80).default('');

/** What the list of sweeps takes from its address. */
export const sweepsQuery = listing(['driven', 'name', 'newest'], 'down').extend({
	rig,
	state: state.default('open')
});
export type SweepsQuery = z.output<typeof sweepsQuery>;

export const sweepsApiQuery = apiListing.extend({
	rig: rig.describe('Slug of a rig.'),
	state: state.default('all')
});
export type SweepsApiQuery = z.output<typeof sweepsApiQuery>;

/** A pass as its form sends it: a block of threads, current and clock, one point a line. */
export const passForm = z
	.object({
		key: z.string().regex(/^[\w-]{8,60}$/, 'The page is incomplete: load it again.'),
		points: z.string().max(100_000, 'That is too much for one pass. Nothing was entered.'),
		ambientC: z.string().trim().max(40).default(''),
		/** Local time in the publication's zone; empty for now. */
		started: z.string().trim().max(40).default(''),
		notes: paragraphs(1000).default(''),
		/** “on” where a person says that what was asked about is as measured. */
		sure: z.string().max(10).default('')
	})
	.transform(({ points, started, sure, ...rest }, ctx): SweepPassInput & { started: string } => {
		const fault = (path: string, message: string) => {
			ctx.addIssue({ code: 'custom', path: [path], message });
		};
		const block = passBlock(points);
		if (!block.ok) {
			fault('points', block.message);
			return z.NEVER;
		}
		const parsed = sweepPassInput.safeParse({ ...rest, points: block.rows, sure: sure === 'on' });
		if (parsed.success) return { ...parsed.data, started };
		for (const { path, message } of parsed.error.issues) {
			const [field = 'points', row] = path;
			const line = typeof row === 'number' ? `Line ${block.lines[row] ?? row + 1}: ` : '';
			fault(String(field), `${line}${message}`);
		}
		return z.NEVER;
	});
export type PassForm = z.output<typeof passForm>;
export type PassFormTyped = z.input<typeof passForm>;

export const blankPass = (key: string): PassFormTyped => ({
	key,
	points: '',
	ambientC: '',
	started: '',
	notes: '',
	sure: ''
});
