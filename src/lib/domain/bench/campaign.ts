import type { CellFigures, Overall, Summary, WorkloadFacts } from './figures';
import { heldAgainst, overallAgainst, testCell } from './held-against';
import { summarise } from './statistics/summary';

export interface CampaignReading {
	value: number;
	excluded: boolean;
}

/** A run with its readings in the order they were taken. */
export interface CampaignRun<R extends CampaignReading = CampaignReading> {
	profile: string;
	workload: string;
	tester: string;
	/** ISO time. */
	startedAt: string;
	ambientC: number | null;
	voided: boolean;
	readings: R[];
}

export interface CampaignMatrix {
	/** Slugs, in the campaign's order. */
	profiles: string[];
	/** In the campaign's order, with the readings each of their cells needs. */
	workloads: (WorkloadFacts & { needed: number })[];
	/** In the order they were recorded. */
	runs: CampaignRun[];
	/** Standing signatures only. */
	signatures: { profile: string; workload: string; signedBy: string; signedAt: string }[];
	/** Slug of the profile the others are held against. */
	baseline: string;
}

export interface CampaignFigures {
	/** Profile by profile, each in the order of the workloads. */
	cells: CellFigures[];
	/** By profile slug; profiles without a ratio, and the baseline itself, are not in it. */
	overall: Record<string, Overall>;
}

const cellKey = (cell: { profile: string; workload: string }): string => `${cell.profile}/${cell.workload}`;

function byCell<T extends { profile: string; workload: string }>(items: readonly T[]): Map<string, T[]> {
	const map = new Map<string, T[]>();
	for (const item of items) {
		const key = cellKey(item);
		const list = map.get(key);
		if (list) list.push(item);
		else map.set(key, [item]);
	}
	return map;
}

/**
 * The readings of one cell that count: not excluded, of runs not voided. `Summary.flagged` indexes this list.
 */
export function countedReadings<R extends CampaignReading>(runs: readonly CampaignRun<R>[]): R[] {
	const counted: R[] = [];
	for (const run of runs) {
		if (run.voided) continue;
		for (const reading of run.readings) if (!reading.excluded) counted.push(reading);
	}
	return counted;
}

/** What the runs that count say beside their numbers: who, when, how warm. */
function circumstances(
	runs: readonly CampaignRun[]
): Pick<CellFigures, 'testers' | 'from' | 'to' | 'ambientC'> {
	const counted = runs.filter((run) => !run.voided && run.readings.some((reading) => !reading.excluded));
	const starts = counted.map((run) => run.startedAt).sort();
	const ambients = counted.flatMap((run) => (run.ambientC === null ? [] : [run.ambientC]));
	return {
		testers: [...new Set(counted.map((run) => run.tester))],
		from: starts[0] ?? null,
		to: starts.at(-1) ?? null,
		ambientC: ambients.length ? ambients.reduce((sum, value) => sum + value, 0) / ambients.length : null
	};
}

/** How figures are worked out: a server that figures the same readings again and again may remember them. */
export interface Figuring {
	summarise: typeof summarise;
	testCell: typeof testCell;
}

/**
 * The cells of a campaign: each one's summary and its ratio to the baseline (or difference, where a ratio says nothing)
 * with interval and verdict.
 * RangeError where the baseline is not one of the profiles.
 */
export function summariseMatrix(
	matrix: CampaignMatrix,
	by: Figuring = { summarise, testCell }
): CellFigures[] {
	if (!matrix.profiles.includes(matrix.baseline)) {
		throw new RangeError('The baseline must be one of the profiles of the campaign.');
	}
	const runs = byCell(matrix.runs);
	const signatures = byCell(matrix.signatures);
	const summaryOf = (profile: string, workload: CampaignMatrix['workloads'][number]): Summary | null => {
		const readings = countedReadings(runs.get(cellKey({ profile, workload: workload.slug })) ?? []);
		const values = readings.map((reading) => reading.value);
		return values.length > 0 ? by.summarise(values, workload.headline) : null;
	};
	const measured = matrix.profiles.flatMap((profile) =>
		matrix.workloads.map((workload) => ({
			profile,
			workload: workload.slug,
			needed: workload.needed,
			summary: summaryOf(profile, workload)
		}))
	);
	const standings = heldAgainst(measured, matrix.workloads, matrix.baseline, by.testCell);
	return measured.map((cell, at): CellFigures => {
		const key = cellKey(cell);
		const signature = signatures.get(key)?.at(-1);
		const { testers, from, to, ambientC } = circumstances(runs.get(key) ?? []);
		// Field by field: spread together, the objects of a large board take longer than its figures.
		return {
			profile: cell.profile,
			workload: cell.workload,
			needed: cell.needed,
			summary: cell.summary,
			comparison: standings[at]?.comparison ?? null,
			difference: standings[at]?.difference ?? null,
			signedBy: signature?.signedBy ?? null,
			signedAt: signature?.signedAt ?? null,
			testers,
			from,
			to,
			ambientC
		};
	});
}

/**
 * Every figure of a campaign: its cells, as summariseMatrix has them, and each profile's geometric mean.
 * RangeError where the baseline is not one of the profiles.
 */
export function summariseCampaign(matrix: CampaignMatrix): CampaignFigures {
	const cells = summariseMatrix(matrix);
	const figures: Record<string, Overall> = {};
	for (const profile of matrix.profiles) {
		const figure =
			profile === matrix.baseline ? null : overallAgainst(cells, matrix.workloads, profile, matrix.baseline);
		if (figure) figures[profile] = figure;
	}
	return { cells, overall: figures };
}
