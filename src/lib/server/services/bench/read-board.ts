import { countedReadings } from '../../../domain/bench/campaign';
import type { BoardNews } from '../../../domain/bench/board-news';
import type { CellRun } from '../../../domain/bench/cell-runs';
import { toRun, type ToRun } from '../../../domain/bench/progress';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import { earlierBoard, readBoardOnce, type Board, type BoardRead } from './board-once';
import { changedSince } from './board-snapshot';

export type { Board } from './board-once';

/** The cell the address names; else the next to run, else the first. */
function select(plan: CampaignPlan, wanted: { profile: string; workload: string }, next: ToRun | undefined) {
	const slugOf = (rows: { slug: string }[], ...refs: (string | undefined)[]) =>
		refs.find((ref) => rows.some((row) => row.slug === ref)) ?? rows[0]?.slug ?? '';
	const named = wanted.profile !== '' || wanted.workload !== '';
	return {
		profile: slugOf(plan.profiles, wanted.profile, named ? undefined : next?.profile),
		workload: slugOf(plan.workloads, wanted.workload, named ? undefined : next?.workload)
	};
}

function runsOf({ recorded }: BoardRead['measured'], cell: { profile: string; workload: string }): CellRun[] {
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

/** The cell somebody looks at, whole. */
function selectedOf(
	{ measured, cells, current }: BoardRead,
	wanted: { profile: string; workload: string }
): Board['selected'] {
	const { matrix } = measured;
	const [next] = toRun(cells, current);
	const cell = select(measured.plan, wanted, next);
	const stock = matrix.runs.filter(
		(run) => run.profile === matrix.baseline && run.workload === cell.workload
	);
	return {
		...cell,
		runs: runsOf(measured, cell),
		baselineValues:
			cell.profile === matrix.baseline ? null : countedReadings(stock).map((reading) => reading.value)
	};
}

const mayOf = ({ actor }: Context): Board['may'] => ({
	plan: may(actor, 'bench.plan'),
	record: may(actor, 'run.record'),
	sign: may(actor, 'cell.sign')
});

async function read(ctx: Context, campaignRef: string, gatherMs = 0): Promise<Outcome<BoardRead>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const id = await campaigns.idOf(ctx.db, campaignRef);
	return id === undefined
		? refuse('not_found', 'There is no such campaign.')
		: readBoardOnce(ctx, id, gatherMs);
}

/** The campaign's board: the matrix, how far it is, what to run next, and the selected cell whole. */
export async function readBoard(
	ctx: Context,
	campaignRef: string,
	wanted: { profile: string; workload: string }
): Promise<Outcome<Board>> {
	const found = await read(ctx, campaignRef);
	if (!found.ok) return found;
	const { measured: _measured, snapshot, ...board } = found.value;
	return done({
		...board,
		tag: snapshot.tag,
		selected: selectedOf(found.value, wanted),
		may: mayOf(ctx)
	});
}

/** All who watch a board are told in the same moment, and then ask: so long they are waited for. */
const gatherMs = 50;

/** What changed on a board since the one that somebody has, so that ten who watch are not sent ten boards. */
export async function readBoardNews(
	ctx: Context,
	campaignRef: string,
	{ tag, ...wanted }: { tag: string; profile: string; workload: string }
): Promise<Outcome<BoardNews>> {
	const found = await read(ctx, campaignRef, gatherMs);
	if (!found.ok) return found;
	const { snapshot, state, progress, signed, current, newest } = found.value;
	const changed = changedSince(earlierBoard(ctx, found.value, tag), snapshot, found.value);
	if (!changed) return done({ kind: 'anew' });
	return done({
		kind: 'changed',
		from: tag,
		tag: snapshot.tag,
		...changed,
		state,
		progress,
		signed,
		current,
		newest,
		selected: selectedOf(found.value, wanted),
		may: mayOf(ctx)
	});
}
