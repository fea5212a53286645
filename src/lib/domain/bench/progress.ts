import type { CellFigures, Summary } from './figures';

/** A cell as far as progress is concerned: only how many readings of it count. */
export type CellProgress = Pick<CellFigures, 'profile' | 'workload' | 'needed'> & {
	summary: Pick<Summary, 'n'> | null;
};

export interface Progress {
	/** Readings taken, a cell never counting for more than it needs. */
	taken: number;
	needed: number;
}

const takenOf = (cell: CellProgress): number => Math.min(cell.summary?.n ?? 0, cell.needed);

/** How far a set of cells is: readings taken of readings needed. */
export function progress(cells: readonly CellProgress[]): Progress {
	let taken = 0;
	let needed = 0;
	for (const cell of cells) {
		taken += takenOf(cell);
		needed += cell.needed;
	}
	return { taken, needed };
}

export interface ToRun {
	profile: string;
	workload: string;
	/** Readings still wanted. */
	remaining: number;
	/** Whether the rig must be restarted into another profile first. */
	changesProfile: boolean;
}

/**
 * What is left to run, first things first: the profile the rig is in now is finished before another is set,
 * because each change is a restart; otherwise the order of the cells given (the campaign's own).
 * @param current profile of the latest run, or null before the first
 */
export function toRun(cells: readonly CellProgress[], current: string | null): ToRun[] {
	const open = cells.filter((cell) => takenOf(cell) < cell.needed);
	const profiles = [...new Set(open.map((cell) => cell.profile))];
	const order = profiles.includes(current ?? '')
		? [current, ...profiles.filter((profile) => profile !== current)]
		: profiles;
	let now = current;
	return order.flatMap((profile) =>
		open
			.filter((cell) => cell.profile === profile)
			.map((cell) => {
				const changesProfile = cell.profile !== now;
				now = cell.profile;
				return {
					profile: cell.profile,
					workload: cell.workload,
					remaining: cell.needed - takenOf(cell),
					changesProfile
				};
			})
	);
}

/** How often the rig must be restarted into another profile to run a list in its order. */
export const restartsOf = (list: readonly ToRun[]): number =>
	list.filter((cell) => cell.changesProfile).length;

/** What is left of one profile, of a list to run. */
export interface ProfileToRun {
	profile: string;
	/** Whether the rig is restarted into it first. */
	restart: boolean;
	/** Readings wanted in all its cells. */
	remaining: number;
	cells: { workload: string; remaining: number }[];
}

/** A list to run, gathered by profile in its order: between two of them lies a restart. */
export function byProfile(list: readonly ToRun[]): ProfileToRun[] {
	const groups: ProfileToRun[] = [];
	for (const { profile, workload, remaining, changesProfile } of list) {
		const last = groups.at(-1);
		const group =
			last?.profile === profile ? last : { profile, restart: changesProfile, remaining: 0, cells: [] };
		if (group !== last) groups.push(group);
		group.remaining += remaining;
		group.cells.push({ workload, remaining });
	}
	return groups;
}

/**
 * The profile the rig was last run in, from runs voided or not; null before the first run.
 * @param runs with ISO times in one zone
 */
export function currentProfile(runs: readonly { profile: string; startedAt: string }[]): string | null {
	let latest: { profile: string; startedAt: string } | null = null;
	for (const run of runs) {
		if (!latest || run.startedAt >= latest.startedAt) latest = run;
	}
	return latest?.profile ?? null;
}
