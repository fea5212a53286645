import { z } from 'zod';
import { stressKinds } from '../domain/bench/stability/words';
import { line, number, optionalSlug, paragraphs, reference, versionSeen } from './fields';
import { apiListing, listing } from './listing';
import { attemptInput } from './stability';

const name = line(160).min(1, 'A ladder needs a name.');
const purpose = paragraphs(5000).default('');

const limits = {
	/** The board's own step, in MHz. */
	stepMhz: number({ min: 1, max: 1000, decimals: 0 }),
	/** Beyond these nothing is proposed. */
	limitClockMhz: number({ min: 100, max: 12_000, decimals: 0 }),
	limitVolts: number({ min: 0.3, max: 2.5, decimals: 4 }),
	limitTempC: number({ min: 20, max: 150, decimals: 1 }),
	limitSource: line(200).min(1, 'Say whose limits these are, such as the maker’s data sheet.')
};

const mostStresses = 8;

/** One line of the choice of stresses; a line without a workload is one left empty. */
const stressLine = z
	.object({
		workload: z
			.union([z.string(), z.int()])
			.transform((ref) => String(ref).trim())
			.default(''),
		kind: z.enum(stressKinds, 'Say whether it is the heaviest load or an everyday one.').default('heaviest'),
		/** Minutes without failure that count as a pass. */
		minutes: z.union([z.string(), z.number()]).default('')
	})
	.superRefine((row, ctx) => {
		if (row.workload === '') return;
		const message = demanded.safeParse(row.minutes).error?.issues[0]?.message;
		if (message) ctx.addIssue({ code: 'custom', message, path: ['minutes'] });
	});
const demanded = number({ min: 1, max: 100_000, decimals: 0 });

const stresses = z
	.array(stressLine)
	.max(100, 'That is too long a list.')
	.transform((rows) =>
		rows
			.filter((row) => row.workload !== '')
			.map(({ minutes, ...row }) => ({ ...row, minutes: demanded.safeParse(minutes).data ?? 0 }))
	)
	.refine((rows) => rows.length > 0, 'Choose at least one stress.')
	.refine((rows) => rows.length <= mostStresses, `A ladder has at most ${mostStresses} stresses.`)
	.refine(
		(rows) => new Set(rows.map((row) => row.workload)).size === rows.length,
		'A stress is on a ladder once.'
	);

/** A ladder: a rig as it stands now, a profile of it, the stresses, and limits beyond which nothing is proposed. */
export const ladderInput = z.object({
	name,
	slug: optionalSlug,
	rig: reference('Choose a rig.'),
	profile: reference('Choose a profile.'),
	stresses,
	purpose,
	...limits
});
export type LadderInput = z.output<typeof ladderInput>;
export type LadderTyped = z.input<typeof ladderInput>;

/** What may be said differently later. */
export const ladderEdit = z.object({ name, purpose, ...limits, version: versionSeen });
export type LadderEdit = z.output<typeof ladderEdit>;
export type LadderEditTyped = z.input<typeof ladderEdit>;

export const blankLadder = (rig: string, profile: string): LadderTyped => ({
	name: '',
	slug: '',
	rig,
	profile,
	stresses: [
		{ workload: '', kind: 'heaviest', minutes: '30' },
		{ workload: '', kind: 'everyday', minutes: '30' },
		{ workload: '', kind: 'everyday', minutes: '30' }
	],
	purpose: '',
	stepMhz: '25',
	limitClockMhz: '',
	limitVolts: '',
	limitTempC: '',
	limitSource: ''
});

export const archiveInput = z.object({ archived: z.enum(['yes', 'no']), version: versionSeen });
export type ArchiveInput = z.output<typeof archiveInput>;

const reason = line(500).min(1, 'Say why: the reason stays in the history.');

export const attemptVoid = z.object({ attempt: z.coerce.number().int().positive(), reason });
export type AttemptVoid = z.output<typeof attemptVoid>;

const state = z.enum(['open', 'archived', 'all']);
const rig = z.string().trim().max(80).default('');

/** What the list of ladders takes from its address. */
export const laddersQuery = listing(['tried', 'name', 'newest'], 'down').extend({
	rig,
	state: state.default('open')
});
export type LaddersQuery = z.output<typeof laddersQuery>;

export const laddersApiQuery = apiListing.extend({
	rig: rig.describe('Slug of a rig.'),
	state: state.default('all')
});
export type LaddersApiQuery = z.output<typeof laddersApiQuery>;

/** One attempt as its form sends it: a local time in the publication's zone in place of one with an offset. */
export const attemptForm = attemptInput.safeExtend({ started: z.string().trim().max(40).default('') });
export type AttemptForm = z.output<typeof attemptForm>;
export type AttemptFormTyped = z.input<typeof attemptForm>;
