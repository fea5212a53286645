import type { MovingBoard } from '../../../domain/bench/board-news';
import type { InstrumentFacts } from '../../../domain/bench/cell-uncertainty';
import type { WorkloadFacts } from '../../../domain/bench/figures';
import { summariseMatrix } from '../../../domain/bench/campaign';
import { campaignState } from '../../../domain/bench/campaign-state';
import { defaultBaseline, matrixOf, type StoredMatrix } from '../../../domain/bench/matrix';
import { currentProfile, progress } from '../../../domain/bench/progress';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/campaign-articles';
import * as facts from '../../db/queries/campaign-facts';
import type { CampaignReadings } from '../../db/queries/campaign-readings';
import * as live from '../../db/queries/live';
import * as settings from '../../db/queries/settings';
import { recentSnapshots, snapshotOf, type Snapshot } from './board-snapshot';
import { keptRuns } from './kept-runs';
import { rememberedFigures } from './remembered-figures';
import { campaignOff } from './rig-off';
import { sharedReads } from './share-read';

/** A campaign's board as one person has it, with a cell of it whole. */
export interface Board extends MovingBoard {
	head: facts.CampaignHead;
	articles: { slug: string; title: string }[];
	profiles: { slug: string; name: string }[];
	workloads: (WorkloadFacts & { needed: number; instrument: InstrumentFacts | null })[];
	baseline: string;
	zone: string;
}

/** A board as everybody has it who may read it, with what its cells are made of. */
export interface BoardRead extends Omit<Board, 'tag' | 'selected' | 'may'> {
	measured: { plan: facts.CampaignPlan; recorded: CampaignReadings; matrix: StoredMatrix };
	snapshot: Snapshot;
}

interface Kept {
	share: ReturnType<typeof sharedReads<Outcome<BoardRead>>>;
	runs: ReturnType<typeof keptRuns>;
	snapshots: ReturnType<typeof recentSnapshots>;
}

// One for each database, as tests have several.
const byDatabase = new WeakMap<Context['db'], Kept>();
/** Some twelve boards of the size that a lab has; a summary is a few hundred bytes. */
const figuring = rememberedFigures(10_000);

function keptOf({ db }: Pick<Context, 'db'>): Kept {
	const kept = byDatabase.get(db) ?? {
		share: sharedReads<Outcome<BoardRead>>(),
		runs: keptRuns(),
		snapshots: recentSnapshots()
	};
	byDatabase.set(db, kept);
	return kept;
}

async function read(ctx: Pick<Context, 'db'>, campaignId: number): Promise<Outcome<BoardRead>> {
	const { runs, snapshots } = keptOf(ctx);
	// Before the figures, so that what comes in between is told once more rather than never.
	const newest = await live.newestOf(ctx.db, campaignId);
	const [[plan], recorded, bound, { zone }] = await Promise.all([
		facts.plansOf(ctx.db, [campaignId]),
		runs(ctx, campaignId),
		articles.ofCampaign(ctx.db, campaignId),
		settings.publication(ctx.db)
	]);
	if (!plan) return refuse('not_found', 'There is no such campaign.');
	const baseline = defaultBaseline(plan.profiles);
	if (baseline === null) return refuse('invalid', 'This campaign has no profiles.');
	const matrix = matrixOf(plan, recorded, baseline);
	const off = await campaignOff(ctx, { plan, matrix });
	const cells = summariseMatrix(matrix, figuring);
	const signed = cells.filter((one) => one.signedAt !== null).length;
	const planned = {
		head: plan.head,
		articles: bound.map(({ slug, title }) => ({ slug, title })),
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: plan.workloads,
		baseline,
		zone
	};
	const moving = {
		state: campaignState({
			archived: plan.head.archivedAt !== null,
			runs: recorded.runs.filter((run) => run.voidedAt === null).length,
			cells: cells.length,
			signed
		}),
		off,
		progress: progress(cells),
		signed,
		current: currentProfile(matrix.runs),
		cells
	};
	const snapshot = snapshotOf(moving, planned, snapshots.last(campaignId));
	snapshots.keep(campaignId, snapshot);
	return done({ ...planned, ...moving, newest, measured: { plan, recorded, matrix }, snapshot });
}

/**
 * A campaign's board, read once for all who ask at the same time, and never before they asked; whoever asks may read it.
 */
export const readBoardOnce = (
	ctx: Pick<Context, 'db'>,
	campaignId: number,
	gatherMs = 0
): Promise<Outcome<BoardRead>> => keptOf(ctx).share(campaignId, () => read(ctx, campaignId), gatherMs);

/** The board of that tag, where this process handed it out of late. */
export const earlierBoard = (
	ctx: Pick<Context, 'db'>,
	{ head }: Pick<BoardRead, 'head'>,
	tag: string
): Snapshot | undefined => keptOf(ctx).snapshots.find(head.id, tag);
