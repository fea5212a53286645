import type { CellFigures, Comparison, Overall, Summary, WorkloadFacts } from './figures';
import { compareSummaries } from './statistics/compare';
import { overall } from './statistics/overall';
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
export const countedReadings = <R extends CampaignReading>(runs: readonly CampaignRun<R>[]): R[] =>
	runs.filter((run) => !run.voided).flatMap((run) => run.readings.filter((reading) => !reading.excluded));

/** What the runs that count say beside their numbers: who, when, how warm. */
function circumstances(
	runs: readonly CampaignRun[]
): Pick<CellFigures, 'testers' | 'from' | 'to' | 'ambientC'> {
	const counted = runs.filter((run) => countedReadings([run]).length > 0);
	const starts = counted.map((run) => run.startedAt).sort();
	const ambients = counted.flatMap((run) => (run.ambientC === null ? [] : [run.ambientC]));
	return {
		testers: [...new Set(counted.map((run) => run.tester))],
		from: starts[0] ?? null,
		to: starts.at(-1) ?? null,
		ambientC: ambients.length ? ambients.reduce((sum, value) => sum + value, 0) / ambients.length : null
	};
}

/** Null where a side is empty or its mean is not above zero. */
const compared = (
	subject: Summary | null,
	baseline: Summary | null,
	{ better, leastDifferencePercent }: WorkloadFacts
): Comparison | null =>
	subject && baseline && subject.mean > 0 && baseline.mean > 0
		? compareSummaries(subject, baseline, better, leastDifferencePercent)
		: null;

/**
 * Every figure of a campaign: each cell's summary, its ratio to the baseline with interval and verdict,
 * and each profile's geometric mean. A cell whose mean is not above zero has no ratio.
 * RangeError where the baseline is not one of the profiles.
 */
export function summariseCampaign(matrix: CampaignMatrix): CampaignFigures {
	if (!matrix.profiles.includes(matrix.baseline)) {
		throw new RangeError('The baseline must be one of the profiles of the campaign.');
	}
	const runs = byCell(matrix.runs);
	const signatures = byCell(matrix.signatures);
	const summaryOf = (profile: string, workload: CampaignMatrix['workloads'][number]): Summary | null => {
		const readings = countedReadings(runs.get(cellKey({ profile, workload: workload.slug })) ?? []);
		const values = readings.map((reading) => reading.value);
		return values.length > 0 ? summarise(values, workload.headline) : null;
	};
	const baselines = new Map(
		matrix.workloads.map((workload) => [workload.slug, summaryOf(matrix.baseline, workload)])
	);

	const cells = matrix.profiles.flatMap((profile) =>
		matrix.workloads.map((workload): CellFigures => {
			const cell = { profile, workload: workload.slug };
			const summary = summaryOf(profile, workload);
			const against = profile === matrix.baseline ? null : (baselines.get(workload.slug) ?? null);
			const signature = signatures.get(cellKey(cell))?.at(-1);
			return {
				...cell,
				needed: workload.needed,
				summary,
				comparison: compared(summary, against, workload),
				signedBy: signature?.signedBy ?? null,
				signedAt: signature?.signedAt ?? null,
				...circumstances(runs.get(cellKey(cell)) ?? [])
			};
		})
	);

	const figures: Record<string, Overall> = {};
	for (const profile of matrix.profiles) {
		const figure =
			profile === matrix.baseline ? null : overall(cells.filter((cell) => cell.profile === profile));
		if (figure) figures[profile] = figure;
	}
	return { cells, overall: figures };
}
