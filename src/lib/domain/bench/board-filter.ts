import type { CellFigures, WorkloadFacts } from './figures';

export const cellStates = ['unfinished', 'noisy', 'flagged', 'unsigned'] as const;
/** What a cell can be looked for by. */
export type CellState = (typeof cellStates)[number];

export const cellStateWords: Record<CellState, string> = {
	unfinished: 'unfinished',
	noisy: 'noisy',
	flagged: 'flagged',
	unsigned: 'not signed'
};

export interface BoardFilter {
	/** Empty for cells in any state. */
	show: CellState | '';
	/** Words in the name of the profile. */
	row: string;
	/** Class of the workload; empty for all. */
	class: WorkloadFacts['class'] | '';
}

type Cell = Pick<CellFigures, 'profile' | 'workload' | 'needed' | 'summary' | 'signedAt'>;
type Workload = Pick<WorkloadFacts, 'slug' | 'class' | 'leastDifferencePercent'>;

/**
 * Whether the readings of a cell scatter more than the least difference that matters for its workload: then a few more
 * may not be able to tell it (common practice, no source).
 */
export const isNoisy = (cell: Pick<Cell, 'summary'>, workload: Workload | undefined): boolean =>
	(cell.summary?.cvPercent ?? 0) > (workload?.leastDifferencePercent ?? Infinity);

function inState(cell: Cell, state: BoardFilter['show'], workload: Workload | undefined): boolean {
	if (state === 'unfinished') return (cell.summary?.n ?? 0) < cell.needed;
	if (state === 'noisy') return isNoisy(cell, workload);
	if (state === 'flagged') return (cell.summary?.flagged.length ?? 0) > 0;
	return state === '' || cell.signedAt === null;
}

export interface FilteredBoard<P, W, C> {
	workloads: W[];
	/** Rows in the campaign's order, each with its cells in the order of the workloads shown. */
	rows: { profile: P; cells: { cell: C; matches: boolean }[] }[];
	hiddenProfiles: number;
	hiddenWorkloads: number;
	/** Cells that match. */
	found: number;
}

const has = (text: string, words: string): boolean => text.toLowerCase().includes(words.trim().toLowerCase());

/** A board as its filter shows it: rows and columns in which nothing matches are left out and counted. */
export function filterBoard<P extends { slug: string; name: string }, W extends Workload, C extends Cell>(
	board: { profiles: readonly P[]; workloads: readonly W[]; cells: readonly C[] },
	filter: BoardFilter
): FilteredBoard<P, W, C> {
	const workloadOf = new Map(board.workloads.map((workload) => [workload.slug, workload]));
	const named = new Set(
		board.profiles.filter((profile) => has(profile.name, filter.row)).map((profile) => profile.slug)
	);
	const matches = (cell: C): boolean => {
		const workload = workloadOf.get(cell.workload);
		return (
			named.has(cell.profile) &&
			(filter.class === '' || workload?.class === filter.class) &&
			inState(cell, filter.show, workload)
		);
	};
	const matching = board.cells.filter(matches);
	const rowsShown = new Set(matching.map((cell) => cell.profile));
	const columnsShown = new Set(matching.map((cell) => cell.workload));
	const hit = new Set<C>(matching);
	const workloads = board.workloads.filter((workload) => columnsShown.has(workload.slug));
	const rows = board.profiles
		.filter((profile) => rowsShown.has(profile.slug))
		.map((profile) => ({
			profile,
			cells: board.cells
				.filter((cell) => cell.profile === profile.slug && columnsShown.has(cell.workload))
				.map((cell) => ({ cell, matches: hit.has(cell) }))
		}));
	return {
		workloads,
		rows,
		hiddenProfiles: board.profiles.length - rows.length,
		hiddenWorkloads: board.workloads.length - workloads.length,
		found: matching.length
	};
}

const some = (n: number, one: string, many: string): string => (n === 1 ? `one ${one}` : `${n} ${many}`);

/** What a filter leaves out, in words; empty where nothing is. @example hiddenWords({ hiddenProfiles: 2, hiddenWorkloads: 0 }) */
export function hiddenWords({
	hiddenProfiles,
	hiddenWorkloads
}: Pick<FilteredBoard<unknown, unknown, unknown>, 'hiddenProfiles' | 'hiddenWorkloads'>): string {
	const parts = [
		hiddenProfiles > 0 ? some(hiddenProfiles, 'profile', 'profiles') : '',
		hiddenWorkloads > 0 ? some(hiddenWorkloads, 'workload', 'workloads') : ''
	].filter(Boolean);
	if (parts.length === 0) return '';
	const words = parts.join(' and ');
	const verb = hiddenProfiles + hiddenWorkloads === 1 ? 'is' : 'are';
	return `${words.charAt(0).toUpperCase()}${words.slice(1)} without such a cell ${verb} not shown.`;
}
