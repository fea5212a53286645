import { campaignState, type CampaignState } from '../../../domain/bench/campaign-state';
import { countedReadings } from '../../../domain/bench/campaign';
import type { InstrumentFacts } from '../../../domain/bench/cell-uncertainty';
import type { CellRun } from '../../../domain/bench/cell-runs';
import type { CellOff } from '../../../domain/bench/drift-facts';
import type { CellFigures, WorkloadFacts } from '../../../domain/bench/figures';
import { currentProfile, progress, toRun, type Progress, type ToRun } from '../../../domain/bench/progress';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as articles from '../../db/queries/campaign-articles';
import type { CampaignHead } from '../../db/queries/campaign-facts';
import * as live from '../../db/queries/live';
import * as settings from '../../db/queries/settings';
import { readCampaign, type MeasuredCampaign } from './read-campaign';
import { sharedReads } from './share-read';
import { campaignOff } from './rig-off';

export interface Board {
	head: CampaignHead;
	state: CampaignState;
	articles: { slug: string; title: string }[];
	/** Cells measured while the rig was off, by its own stock. */
	off: CellOff[];
	profiles: { slug: string; name: string }[];
	workloads: (WorkloadFacts & { needed: number; instrument: InstrumentFacts | null })[];
	baseline: string;
	cells: CellFigures[];
	progress: Progress;
	signed: number;
	/** Profile of the latest run: what the rig is in; null before the first. */
	current: string | null;
	/** Newest entry of the history that is surely in these figures: what comes after it is told live. */
	newest: number;
	selected: { profile: string; workload: string; runs: CellRun[]; baselineValues: number[] | null };
	zone: string;
	may: { plan: boolean; record: boolean; sign: boolean };
}

/** The cell the address names; else the next to run, else the first. */
function select(
	{ plan }: MeasuredCampaign,
	wanted: { profile: string; workload: string },
	next: ToRun | undefined
) {
	const slugOf = (rows: { slug: string }[], ...refs: (string | undefined)[]) =>
		refs.find((ref) => rows.some((row) => row.slug === ref)) ?? rows[0]?.slug ?? '';
	const named = wanted.profile !== '' || wanted.workload !== '';
	return {
		profile: slugOf(plan.profiles, wanted.profile, named ? undefined : next?.profile),
		workload: slugOf(plan.workloads, wanted.workload, named ? undefined : next?.workload)
	};
}

function runsOf({ recorded }: MeasuredCampaign, cell: { profile: string; workload: string }): CellRun[] {
	return recorded.runs
		.filter((run) => run.profile === cell.profile && run.workload === cell.workload)
		.map((run) => ({
			id: run.id,
			version: run.version,
			tester: run.tester,
			source: run.source,
			startedAt: run.startedAt,
			ambientC: run.ambientC,
			notes: run.notes,
			voided: run.voidReason,
			readings: run.readings.map(({ id, value, excludeReason }) => ({
				id,
				value,
				excluded: excludeReason
			}))
		}));
}

function boardOf(
	measured: MeasuredCampaign,
	wanted: { profile: string; workload: string }
): Omit<Board, 'articles' | 'off' | 'zone' | 'may' | 'newest'> {
	const { plan, matrix, figures, recorded } = measured;
	const current = currentProfile(matrix.runs);
	const [next] = toRun(figures.cells, current);
	const cell = select(measured, wanted, next);
	const signed = figures.cells.filter((one) => one.signedAt !== null).length;
	return {
		head: plan.head,
		state: campaignState({
			archived: plan.head.archivedAt !== null,
			runs: recorded.runs.filter((run) => run.voidedAt === null).length,
			cells: figures.cells.length,
			signed
		}),
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: plan.workloads,
		baseline: matrix.baseline,
		cells: figures.cells,
		progress: progress(figures.cells),
		signed,
		current,
		selected: {
			...cell,
			runs: runsOf(measured, cell),
			baselineValues:
				cell.profile === matrix.baseline
					? null
					: countedReadings(
							matrix.runs.filter((run) => run.profile === matrix.baseline && run.workload === cell.workload)
						).map((reading) => reading.value)
		}
	};
}

interface ReadOnce {
	newest: number;
	measured: Outcome<MeasuredCampaign>;
}

// What is read is the same for everybody who may read it; one for each database, as tests have several.
const shares = new WeakMap<Context['db'], ReturnType<typeof sharedReads<ReadOnce>>>();

function share({ db }: Context) {
	const found = shares.get(db) ?? sharedReads<ReadOnce>();
	shares.set(db, found);
	return found;
}

/** The campaign's board: the matrix, how far it is, what to run next, and the selected cell whole. */
export async function readBoard(
	ctx: Context,
	campaignRef: string,
	wanted: { profile: string; workload: string }
): Promise<Outcome<Board>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const id = await campaigns.idOf(ctx.db, campaignRef);
	if (id === undefined) return refuse('not_found', 'There is no such campaign.');
	const { newest, measured } = await share(ctx)(id, async () => ({
		// Before the figures, so that what comes in between is told once more rather than never.
		newest: await live.newestOf(ctx.db, id),
		measured: await readCampaign(ctx, String(id))
	}));
	if (!measured.ok) return measured;
	const [bound, off, { zone }] = await Promise.all([
		articles.ofCampaign(ctx.db, measured.value.plan.head.id),
		campaignOff(ctx, measured.value),
		settings.publication(ctx.db)
	]);
	return done({
		...boardOf(measured.value, wanted),
		off,
		articles: bound.map(({ slug, title }) => ({ slug, title })),
		zone,
		newest,
		may: {
			plan: may(ctx.actor, 'bench.plan'),
			record: may(ctx.actor, 'run.record'),
			sign: may(ctx.actor, 'cell.sign')
		}
	});
}
