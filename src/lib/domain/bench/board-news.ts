import type { CampaignState } from './campaign-state';
import type { CellRun } from './cell-runs';
import type { CellOff } from './drift-facts';
import type { CellFigures } from './figures';
import type { Progress } from './progress';

/** What of a board moves while it is measured; the rest is its plan. */
export interface MovingBoard {
	/** Of everything on the board that is the same for all who look: two with one tag are the same. */
	tag: string;
	cells: CellFigures[];
	state: CampaignState;
	/** Cells measured while the rig was off, by its own stock. */
	off: CellOff[];
	progress: Progress;
	signed: number;
	/** Profile of the latest run: what the rig is in; null before the first. */
	current: string | null;
	/** Newest entry of the history that is surely in these figures: what comes after it is told live. */
	newest: number;
	selected: { profile: string; workload: string; runs: CellRun[]; baselineValues: number[] | null };
	may: { plan: boolean; record: boolean; sign: boolean };
}

/**
 * What makes of the board that somebody has, named by its tag, the board as it is now; or that there is no such way,
 * because the plan changed or the server does not know that board any more, and it must be read anew.
 */
export type BoardNews =
	| { kind: 'anew' }
	| ({
			kind: 'changed';
			/** The board that it leads from. */
			from: string;
			/** Cells that are other than they were, by their place. */
			cells: { at: number; cell: CellFigures }[];
			/** Left out where it is what it was. */
			off?: CellOff[];
	  } & Omit<MovingBoard, 'cells' | 'off'>);

/** News as they came over the wire, where a time is its ISO text. */
type Wired<T> = T extends Date ? string : T extends object ? { [K in keyof T]: Wired<T[K]> } : T;
export type WiredNews = Wired<BoardNews>;

/**
 * A board with its news; null where they do not lead on from it. What did not change stays the same object.
 * @example withNews(board, await response.json()) ?? (await readAnew())
 */
export function withNews<B extends MovingBoard>(board: B, news: WiredNews): B | null {
	if (news.kind === 'anew' || news.from !== board.tag) return null;
	const { kind: _kind, from: _from, cells: changed, off, selected, ...moved } = news;
	const cells = changed.length > 0 ? [...board.cells] : board.cells;
	for (const { at, cell } of changed) cells[at] = cell;
	return {
		...board,
		...moved,
		cells,
		off: off ?? board.off,
		selected: {
			...selected,
			runs: selected.runs.map((run) => ({ ...run, startedAt: new Date(run.startedAt) }))
		}
	};
}
