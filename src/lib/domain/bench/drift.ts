import {
	beginningWords,
	type ControlChart,
	controlChart,
	type ChartPoint,
	signalWords
} from './statistics/control-chart';
import { type ControlLimits, movingRanges } from './statistics/control-limits';

/** A run of stock that counts: the readings of it that do, in the workload's unit. */
export interface StockRun {
	run: number;
	/** Slug and name. */
	campaign: string;
	campaignName: string;
	/** Revision of the rig it was taken on. */
	revision: number;
	/** When it began, ISO. */
	at: string;
	values: number[];
}

/** One run on the chart. Unit: the workload's. */
export interface DriftPoint extends Omit<StockRun, 'values'> {
	/** Number of the run in the series, from 1. */
	number: number;
	n: number;
	mean: number;
	/** One of those that the limits are made from. */
	inWindow: boolean;
	/** Distance from the run before; null for the first. */
	movingRange: number | null;
	/** Weighted average with its limits; null within the window. */
	average: Pick<ChartPoint, 'ewma' | 'lower' | 'upper'> | null;
	/** What this run signals, in words. */
	signals: string[];
	/** Why the weighted average begins anew with this run, in words; null where it goes on. */
	begun: string | null;
}

/** Numbers of the first and the last run that are held to be in order, from 1. */
export interface DriftWindow {
	from: number;
	to: number;
}

export interface Drift {
	window: DriftWindow;
	/** Null where no limits can be made; `why` says so in one sentence. */
	limits: ControlLimits | null;
	why: string | null;
	points: DriftPoint[];
}

/** Runs that the limits are made from when nobody says otherwise. */
export const usualWindow = 8;

const meanOf = (values: readonly number[]): number =>
	values.reduce((sum, value) => sum + value, 0) / values.length;

/** A window as asked, within what there is: two runs at the least, those before it left out. */
export function fitWindow(count: number, asked: Partial<DriftWindow> = {}): DriftWindow {
	const from = Math.max(1, Math.min(asked.from ?? 1, Math.max(1, count - 1)));
	const to = Math.max(from + 1, Math.min(asked.to ?? from + usualWindow - 1, Math.max(count, from + 1)));
	return { from, to };
}

function chartOf(
	window: readonly number[],
	rest: readonly number[],
	revised: ReadonlySet<number>
): ControlChart | string {
	if (window.length < 2) return 'A control chart needs two runs or more of stock to begin with.';
	if (movingRanges(window).every((range) => range === 0))
		return 'The runs it would begin with do not vary at all, so they give no limits.';
	return controlChart(window, rest, { revised });
}

/**
 * The runs of stock with one workload on one rig as an individuals chart of their means: moving ranges, a weighted
 * average, and the signals of each run after the window that the limits are made from. The average begins anew with a
 * revision of the rig and once a signal is mended. Runs before the window stay on the chart without a word.
 * @param runs in the order they were taken; those without a reading that counts are left out
 */
export function driftOf(runs: readonly StockRun[], asked: Partial<DriftWindow> = {}): Drift {
	const taken = runs.filter((run) => run.values.length > 0);
	const means = taken.map((run) => meanOf(run.values));
	const window = fitWindow(taken.length, asked);
	const rest = taken.slice(window.to);
	const revised = new Set(
		rest.flatMap(({ revision }, at) => (revision === taken[window.to + at - 1]?.revision ? [] : [at]))
	);
	const chart = chartOf(means.slice(window.from - 1, window.to), means.slice(window.to), revised);
	const ranges = movingRanges(means);
	const points = taken.map(({ values, ...run }, at): DriftPoint => {
		const charted = typeof chart === 'string' ? undefined : chart.points[at - window.to];
		return {
			...run,
			number: at + 1,
			n: values.length,
			mean: means[at] ?? Number.NaN,
			inWindow: at + 1 >= window.from && at + 1 <= window.to,
			movingRange: ranges[at - 1] ?? null,
			average: charted ? { ewma: charted.ewma, lower: charted.lower, upper: charted.upper } : null,
			signals: (charted?.signals ?? []).map((signal) => signalWords[signal]),
			begun: charted?.begun ? beginningWords[charted.begun] : null
		};
	});
	return {
		window,
		limits: typeof chart === 'string' ? null : chart.limits,
		why: typeof chart === 'string' ? chart : null,
		points
	};
}

/** A stretch of time in which the rig was off: from a run that signals to the next that does not. */
export interface OffSpan {
	from: string;
	/** ISO; null while it still is. */
	to: string | null;
	/** What the first run of it signalled. */
	words: string;
}

/** The stretches in which a chart says that its rig was off, first to last. */
export function offSpans({ points }: Pick<Drift, 'points'>): OffSpan[] {
	const spans: OffSpan[] = [];
	let open: OffSpan | null = null;
	for (const point of points) {
		if (point.signals.length > 0 && !open) {
			open = { from: point.at, to: null, words: point.signals.join('; ') };
			spans.push(open);
		} else if (point.signals.length === 0 && open) {
			open.to = point.at;
			open = null;
		}
	}
	return spans;
}

/** Whether a time lies in one of the stretches; the first that holds it. */
export const spanAt = <S extends OffSpan>(spans: readonly S[], at: string): S | undefined =>
	spans.find(({ from, to }) => at >= from && (to === null || at < to));
