import { campaignInput } from '../../../schemas/campaign';
import { gridInput, runInput } from '../../../schemas/run';
import { importInput } from '../../../schemas/import';
import { importReadings } from '../../services/bench/import-readings';
import { planCampaign } from '../../services/bench/plan-campaign';
import { recordGridReadings } from '../../services/bench/record-grid-readings';
import { recordRun } from '../../services/bench/record-run';
import { signCells } from '../../services/bench/sign-cells';
import type { Act, World } from '../act';
import { readingsAround, seeded } from '../noise';
import type { Who } from '../staff';
import { workloadFacts } from '../workloads';

/** What one cell has that the others have not. */
interface Oddity {
	/** Readings taken, where not as many as the plan asks for. */
	n?: number;
	/** Factors on single readings, by their place from 0. */
	off?: Record<number, number>;
	/** The readings themselves. */
	readings?: number[];
	notes?: string;
}

/** One profile measured through its workloads, one after another. */
interface Sitting {
	profile: string;
	day: number;
	/** When it began; 09:10 when left out. */
	from?: string;
	who: Who;
	/** Only these; all when left out. */
	workloads?: string[];
}

export interface Campaign {
	slug: string;
	name: string;
	rig: string;
	purpose: string;
	plannedOn: number;
	plannedBy: Who;
	dueOn: number | null;
	/** Workloads with what stock measures, in their units. */
	stock: Record<string, number>;
	/** Readings each cell needs. */
	repeats: number;
	/** Profiles other than stock with their gains over it in percent, turned so that more is better. */
	gains: Record<string, Record<string, number>>;
	/** How readings came in: typed into the grid, sent by a script, or read from a file. */
	way: 'grid' | 'script' | 'file';
	sittings: Sitting[];
	/** By profile/workload. */
	odd?: Record<string, Oddity>;
	/** Everything complete, or single cells by profile/workload, signed on a day. */
	signed: { day: number; time: string; who: Who; cells?: string[] }[];
}

interface Cell {
	profile: string;
	workload: string;
	at: Date;
	who: Who;
	ambientC: number;
	readings: number[];
	notes: string;
}

const minutesBetween = 34;

function meanOf(campaign: Campaign, profile: string, workload: string): number {
	const base = campaign.stock[workload] ?? 0;
	const factor = 1 + (campaign.gains[profile]?.[workload] ?? 0) / 100;
	return workloadFacts(workload).better === 'higher' ? base * factor : base / factor;
}

/** The readings of a cell: the mean its gain calls for, scattered as its workload scatters. */
export function readingsOf(campaign: Campaign, profile: string, workload: string): number[] {
	const odd = campaign.odd?.[`${profile}/${workload}`];
	if (odd?.readings) return odd.readings;
	const { cvPercent, decimals } = workloadFacts(workload);
	const drawn = readingsAround(`${campaign.slug}/${profile}/${workload}`, {
		mean: meanOf(campaign, profile, workload),
		cvPercent,
		decimals,
		n: odd?.n ?? campaign.repeats
	});
	return drawn.map((value, at) => Number((value * (odd?.off?.[at] ?? 1)).toFixed(decimals)));
}

/** The cells of a sitting in the order they were measured; those without readings were not reached. */
function cellsOf(world: World, campaign: Campaign, sitting: Sitting): Cell[] {
	const { profile, day, who } = sitting;
	const random = seeded(`${campaign.slug}/${profile}/room`);
	const begun = world.calendar.at(day, sitting.from ?? '09:10').getTime();
	return (sitting.workloads ?? Object.keys(campaign.stock)).flatMap((workload, index) => {
		const readings = readingsOf(campaign, profile, workload);
		const cell = {
			profile,
			workload,
			at: new Date(begun + index * minutesBetween * 60_000),
			who,
			ambientC: Number((20.9 + random()).toFixed(1)),
			readings,
			notes: campaign.odd?.[`${profile}/${workload}`]?.notes ?? ''
		};
		return readings.length > 0 ? [cell] : [];
	});
}

const runKey = (campaign: string, { profile, workload }: Cell) =>
	`demo-${campaign}-${profile}-${workload}`.slice(0, 54);

function typed(world: World, campaign: string, cell: Cell): Act {
	const { profile, workload, at, who, ambientC, readings, notes } = cell;
	const key = runKey(campaign, cell);
	return {
		// A run is on record when it ends.
		at: new Date(at.getTime() + (minutesBetween - 4) * 60_000),
		who,
		what: `readings of ${profile}/${workload}`,
		run: async (ctx) => {
			const outcome = await recordGridReadings(
				ctx,
				campaign,
				gridInput.parse({
					profile,
					workload,
					unit: workloadFacts(workload).unit,
					runKey: key,
					ambientC,
					startedAt: at.toISOString(),
					notes,
					readings: readings.map((value, index) => ({ key: `${key}-${index}`, value }))
				})
			);
			if (outcome.ok) world.runs.set(`${campaign}/${profile}/${workload}`, outcome.value);
			return outcome;
		}
	};
}

function sent(campaign: string, { profile, workload, at, who, ambientC, readings, notes }: Cell): Act {
	return {
		at: new Date(at.getTime() + (minutesBetween - 4) * 60_000),
		who,
		what: `run of ${profile}/${workload}`,
		run: (ctx) =>
			recordRun(
				ctx,
				campaign,
				runInput.parse({
					profile,
					workload,
					readings,
					unit: workloadFacts(workload).unit,
					ambientC,
					startedAt: at.toISOString(),
					notes
				})
			)
	};
}

function fromFile(campaign: string, cells: Cell[], last: Cell): Act {
	const head = 'profile,workload,repeat,value,unit,started_at,ambient_c,notes';
	const lines = cells.flatMap(({ profile, workload, readings, at, ambientC, notes }) =>
		readings.map(
			(value, index) =>
				`${profile},${workload},${index + 1},${value},${workloadFacts(workload).unit},${at.toISOString()},${ambientC},"${notes}"`
		)
	);
	return {
		at: new Date(last.at.getTime() + 45 * 60_000),
		who: last.who,
		what: `import into ${campaign}`,
		run: (ctx) => importReadings(ctx, campaign, importInput.parse({ text: [head, ...lines].join('\n') }))
	};
}

function sittingActs(world: World, campaign: Campaign, sitting: Sitting): Act[] {
	const cells = cellsOf(world, campaign, sitting);
	const last = cells.at(-1);
	if (!last) return [];
	if (campaign.way === 'file') return [fromFile(campaign.slug, cells, last)];
	return cells.map((cell) =>
		campaign.way === 'grid' ? typed(world, campaign.slug, cell) : sent(campaign.slug, cell)
	);
}

function planned({ calendar }: World, campaign: Campaign): Act {
	const { slug, name, rig, purpose, dueOn, stock, gains, repeats } = campaign;
	return {
		at: calendar.at(campaign.plannedOn, '16:20'),
		who: campaign.plannedBy,
		what: `campaign ${slug}`,
		run: (ctx) =>
			planCampaign(
				ctx,
				campaignInput.parse({
					slug,
					name,
					rig,
					purpose,
					dueOn: dueOn === null ? '' : calendar.date(dueOn),
					profiles: ['stock', ...Object.keys(gains)],
					workloads: Object.keys(stock).map((workload) => ({ workload, repeats }))
				})
			)
	};
}

const signedActs = ({ calendar }: World, { slug, signed }: Campaign): Act[] =>
	signed.flatMap(({ day, time, who, cells = ['/'] }) =>
		cells.map((cell): Act => {
			const [profile = '', workload = ''] = cell.split('/');
			return {
				at: calendar.at(day, time),
				who,
				what: `signature under ${slug} ${cell}`,
				run: (ctx) => signCells(ctx, slug, { profile, workload })
			};
		})
	);

/** A campaign from its plan to its signatures. */
export const measured = (world: World, campaign: Campaign): Act[] => [
	planned(world, campaign),
	...campaign.sittings.flatMap((sitting) => sittingActs(world, campaign, sitting)),
	...signedActs(world, campaign)
];
