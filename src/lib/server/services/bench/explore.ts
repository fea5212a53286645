import { DateTime } from 'luxon';
import type { CampaignData } from '../../../domain/articles/data';
import { printedDates } from '../../../domain/articles/dates';
import { gainsSpec } from '../../../domain/articles/plates/gains-spec';
import { scoresSpec } from '../../../domain/articles/plates/scores-spec';
import type { PlateSpec } from '../../../domain/articles/plates/spec';
import { summariseCampaign } from '../../../domain/bench/campaign';
import type { CellFigures, WorkloadFacts } from '../../../domain/bench/figures';
import { comparedTogether } from '../../../domain/bench/held-against';
import { type Named, type Pool, poolRuns } from '../../../domain/bench/pool-runs';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ExploreQuery } from '../../../schemas/explore';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as explored from '../../db/queries/explore';
import * as settings from '../../db/queries/settings';

/** Plates of scores that one look draws. */
const mostPlates = 8;

export interface Explored {
	rigs: Named[];
	parts: Named[];
	/** What there is to choose from, under the rig, part and dates asked for. */
	profiles: Named[];
	workloads: Named[];
	/** Null while nothing is asked for, or nothing was found. */
	found: {
		baseline: string;
		profiles: Named[];
		workloads: WorkloadFacts[];
		cells: CellFigures[];
		together: number;
		plates: PlateSpec[];
	} | null;
	/** Whether a rig or a part is named, without which nothing is looked up. */
	asked: boolean;
	/** Whether older runs were left out. */
	cut: boolean;
}

function dataOf(pool: Pool, rigs: string): CampaignData {
	const { cells, overall } = summariseCampaign(pool.matrix);
	return {
		slug: 'explored',
		name: rigs,
		rig: { slug: '', name: rigs, revision: 0, firmware: '', driver: '', os: '' },
		kit: [],
		profiles: pool.profiles.map((one) => ({ ...one, parent: null, notes: '', settings: [], derived: [] })),
		workloads: pool.workloads,
		baseline: pool.matrix.baseline,
		cells,
		overall
	};
}

/** The plates asked for; their last line names the rigs, whatever their revisions. */
function platesOf(data: CampaignData, kind: ExploreQuery['plate'], zone: string): PlateSpec[] {
	const over = data.profiles.find((one) => one.slug === data.baseline);
	const specs: (PlateSpec | null)[] =
		kind === 'scores'
			? data.workloads.slice(0, mostPlates).map((workload) => scoresSpec(data, workload, { zone }))
			: [over ? gainsSpec(data, over, { zone }) : null];
	const times = data.cells.flatMap((cell) => [cell.from, cell.to].filter((at) => at !== null));
	const last = `${data.name.includes(',') ? 'Rigs' : 'Rig'} ${data.name}, ${printedDates(times, zone)}; runs of several campaigns pooled.`;
	return specs.flatMap((spec) => (spec ? [{ ...spec, foot: [...spec.foot.slice(0, -1), last] }] : []));
}

async function runsAsked(ctx: Context, asked: ExploreQuery, zone: string) {
	const day = (date: string | undefined, plus: number) =>
		date === undefined ? undefined : DateTime.fromISO(date, { zone }).plus({ days: plus }).toJSDate();
	const rows = await explored.runs(ctx.db, {
		rig: asked.rig,
		part: asked.part,
		from: day(asked.from, 0),
		before: day(asked.to, 1)
	});
	const readings = await explored.readingsOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	const values = new Map<number, number[]>(rows.map((row) => [row.id, []]));
	for (const row of readings) values.get(row.runId)?.push(row.value);
	return rows
		.map((row) => ({ ...row, values: values.get(row.id) ?? [] }))
		.filter((row) => row.values.length > 0);
}

const among = (names: readonly string[], slug: string): boolean => names.length === 0 || names.includes(slug);

function foundIn(runs: Awaited<ReturnType<typeof runsAsked>>, asked: ExploreQuery, zone: string) {
	const pool = poolRuns(
		runs.filter((run) => among(asked.profile, run.profile) && among(asked.workload, run.workload.slug)),
		asked.over
	);
	if (!pool) return null;
	const rigs = [...new Set(runs.map((run) => run.rigName))].sort().join(', ');
	const data = dataOf(pool, rigs);
	return {
		baseline: data.baseline,
		profiles: pool.profiles,
		workloads: pool.workloads,
		cells: data.cells,
		together: comparedTogether(data.cells),
		plates: platesOf(data, asked.plate, zone)
	};
}

const named = (rows: readonly Named[]): Named[] =>
	[...new Map(rows.map((row) => [row.slug, row])).values()].sort((a, b) => a.name.localeCompare(b.name));

/** Runs of any campaign by part or rig, profiles, workloads and dates: five queries however much is found. */
export async function explore(ctx: Context, query: ExploreQuery): Promise<Outcome<Explored>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rigs, parts, { zone }] = await Promise.all([
		campaigns.rigsUsed(ctx.db),
		explored.parts(ctx.db),
		settings.publication(ctx.db)
	]);
	const asked = query.rig !== undefined || query.part !== undefined;
	const runs = asked ? await runsAsked(ctx, query, zone) : [];
	return done({
		rigs,
		parts: parts.map(({ slug, maker, model }) => ({ slug, name: `${maker} ${model}` })),
		profiles: named(runs.map((run) => ({ slug: run.profile, name: run.profileName }))),
		workloads: named(runs.map((run) => run.workload)).map(({ slug, name }) => ({ slug, name })),
		found: foundIn(runs, query, zone),
		asked,
		cut: runs.length >= explored.mostRuns
	});
}
