import { z } from 'zod';
import { campaignStates } from '../domain/bench/campaign-state';
import { cellStates } from '../domain/bench/board-filter';
import { workloadClasses } from '../domain/bench/words';
import { line, number, optionalSlug, paragraphs, reference, versionSeen } from './fields';
import { listing } from './listing';

const name = line(160).min(1, 'A campaign needs a name.');
const purpose = paragraphs(5000).default('');

/** A day in the publication's zone; empty for none. */
const day = z
	.string('Write a date such as 2026-11-20.')
	.trim()
	.default('')
	.refine((text) => text === '' || z.iso.date().safeParse(text).success, 'Write a date such as 2026-11-20.');

const repeats = number({ min: 1, max: 1000, decimals: 0 });
const most = 60;

const profiles = z
	.array(reference('Choose a profile.'))
	.max(most, `A campaign has at most ${most} profiles.`)
	.refine((refs) => new Set(refs).size === refs.length, 'A profile is in a campaign once.');

const lineFields = {
	/** Slug or id; a line without one is left unticked. */
	workload: z.union([z.string(), z.int()]).transform(String).default(''),
	/** Readings each of its cells needs; empty takes the workload's own protocol. */
	repeats: z.union([z.string(), z.number()]).default('')
};

interface Line {
	workload: string;
	repeats: string | number;
}

/** A line's repeats are looked at only where it is ticked. */
function soundRepeats(row: Line, ctx: z.RefinementCtx): void {
	if (row.workload === '' || row.repeats === '') return;
	const message = repeats.safeParse(row.repeats).error?.issues[0]?.message;
	if (message) ctx.addIssue({ code: 'custom', message, path: ['repeats'] });
}

/** The ticked ones of a list, with the readings each needs; null takes the workload's own protocol. */
const ticked = <T extends Line>(rows: T[]): (Omit<T, 'repeats'> & { repeats: number | null })[] =>
	rows
		.filter((row) => row.workload !== '')
		.map((row) => ({ ...row, repeats: row.repeats === '' ? null : repeats.parse(row.repeats) }));

const tooLong = 'That is too long a list.';
const few = (rows: readonly unknown[]) => rows.length <= most;
const tooMany = `Choose at most ${most} workloads.`;
const once = (rows: readonly { workload: string }[]) =>
	new Set(rows.map((row) => row.workload)).size === rows.length;
const twice = 'A workload is in it once.';

/** Workloads ticked in a list. */
export const chosenWorkloads = z
	.array(z.object(lineFields).superRefine(soundRepeats))
	.max(1000, tooLong)
	.transform(ticked)
	.refine(few, tooMany)
	.refine(once, twice);

/** The same for a plan, each with what its figures are read from. */
const plannedWorkloads = z
	.array(
		z
			.object({
				...lineFields,
				/** Slug or id of the instrument; empty for the program itself. */
				instrument: z.string().trim().max(80).default('')
			})
			.superRefine(soundRepeats)
	)
	.max(1000, tooLong)
	.transform(ticked)
	.refine(few, tooMany)
	.refine(once, twice);

/** A plan: one rig as it is now, profiles of it, and workloads with the readings each cell needs. */
export const campaignInput = z.object({
	name,
	slug: optionalSlug,
	rig: reference('Choose a rig.'),
	profiles: profiles.min(1, 'Choose at least one profile.'),
	workloads: plannedWorkloads.refine((rows) => rows.length > 0, 'Choose at least one workload.'),
	purpose,
	dueOn: day
});
export type CampaignInput = z.output<typeof campaignInput>;
export type CampaignTyped = z.input<typeof campaignInput>;

/** What may be said differently later. */
export const campaignEdit = z.object({ name, purpose, dueOn: day, version: versionSeen });
export type CampaignEdit = z.output<typeof campaignEdit>;
export type CampaignEditTyped = z.input<typeof campaignEdit>;

/** Rows and columns added to a plan under way. */
export const campaignExtend = z.object({
	profiles: profiles.default([]),
	workloads: chosenWorkloads.default([]),
	version: versionSeen
});
export type CampaignExtend = z.output<typeof campaignExtend>;
export type CampaignExtendTyped = z.input<typeof campaignExtend>;

/** A row or column taken out again, or a column that needs more or fewer readings. */
export const campaignTrim = z.object({
	kind: z.enum(['profile', 'workload']),
	ref: reference('Choose what to remove.'),
	version: versionSeen
});
export type CampaignTrim = z.output<typeof campaignTrim>;

export const campaignRepeats = z.object({
	workload: reference('Choose a workload.'),
	repeats,
	version: versionSeen
});
export type CampaignRepeats = z.output<typeof campaignRepeats>;

/** What the figures of a column are read from; empty for the program itself. */
export const campaignInstrument = z.object({
	workload: reference('Choose a workload.'),
	instrument: z.string().trim().max(80).default(''),
	version: versionSeen
});
export type CampaignInstrument = z.output<typeof campaignInstrument>;

export const campaignArchive = z.object({ archived: z.enum(['yes', 'no']), version: versionSeen });
export type CampaignArchive = z.output<typeof campaignArchive>;

export const campaignsQuery = listing(['created', 'due', 'name'])
	.omit({ way: true })
	.extend({
		rig: z.string().trim().max(80).default(''),
		state: z.enum(['open', ...campaignStates, 'all']).default('open')
	});
export type CampaignsQuery = z.output<typeof campaignsQuery>;

/** What a plan begins with: another campaign's, or a suite's, whose profiles are null. */
export interface PlanBeginning {
	name: string;
	purpose: string;
	profiles: readonly string[] | null;
	/** With the slug of the instrument that each is read from; left out or empty for none. */
	workloads: readonly { slug: string; repeats: number; instrument?: string }[];
}

/**
 * A plan to fill in: all profiles of the rig ticked and the workloads not, each with its own protocol's repeats;
 * or ticked as what it begins with has them.
 */
export const blankCampaign = (
	rig: string,
	offered: readonly { slug: string }[],
	workloads: readonly { slug: string; repeats: number }[],
	begin: PlanBeginning | null = null
): CampaignTyped => ({
	name: begin?.name ?? '',
	slug: '',
	rig,
	profiles: offered.map(({ slug }) => slug).filter((slug) => begin?.profiles?.includes(slug) ?? true),
	workloads: workloads.map(({ slug, repeats: own }) => {
		const chosen = begin?.workloads.find((one) => one.slug === slug);
		return {
			workload: chosen ? slug : '',
			repeats: String(chosen?.repeats ?? own),
			instrument: chosen?.instrument ?? ''
		};
	}),
	purpose: begin?.purpose ?? '',
	dueOn: ''
});

export const campaignsApiQuery = z.object({
	q: z.string().trim().max(200).default('').describe('Words in the name, the slug or the name of the rig.'),
	rig: z.string().trim().max(80).default('').describe('Slug of a rig.'),
	state: z.enum(['open', ...campaignStates, 'all']).default('all'),
	limit: z.coerce.number('Give a whole number.').int('Give a whole number.').min(1).max(200).default(50),
	after: z.coerce
		.number('Pass `next` of the page before.')
		.int()
		.positive()
		.optional()
		.describe('`next` of the page before.')
});
export type CampaignsApiQuery = z.output<typeof campaignsApiQuery>;

export const summaryQuery = z.object({
	baseline: z
		.string()
		.trim()
		.max(80)
		.optional()
		.describe('Slug or id of the profile the others are held against; stock when left out.')
});

/** What a page of trade-offs is asked for: the baseline as above, and the part whose price value is reckoned with. */
export const tradeOffQuery = summaryQuery.extend({ part: z.string().trim().max(120).optional() });

/** Which cell of a board an address selects, which cells it shows, and whether several are being chosen. */
export const boardQuery = z.object({
	profile: z.string().trim().max(80).catch('').default(''),
	workload: z.string().trim().max(80).catch('').default(''),
	show: z
		.enum(['', ...cellStates])
		.catch('')
		.default(''),
	row: z.string().trim().max(80).catch('').default(''),
	class: z
		.enum(['', ...workloadClasses])
		.catch('')
		.default(''),
	choose: z.enum(['', '1']).catch('').default('')
});
export type BoardQuery = z.output<typeof boardQuery>;

/** The board that somebody has, by its tag, and the cell of it that is open. */
export const boardNewsQuery = boardQuery.pick({ profile: true, workload: true }).extend({
	tag: z.string().trim().max(40).catch('').default('')
});

/** A page of a campaign's history, of one cell (profile/workload) or of all. */
export const historyQuery = z.object({
	cell: z.string().trim().max(170).default(''),
	page: z.coerce.number().int().min(1).max(100_000).default(1)
});

/** The last entry of the history that a watcher's page had; null for the newest. */
export const watchQuery = z.object({
	after: z
		.string()
		.regex(/^\d{1,15}$/)
		.transform(Number)
		.nullable()
		.catch(null)
});
