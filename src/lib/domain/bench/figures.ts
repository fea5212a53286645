import type { CostKind } from './cost-of';
import type { Direction, Headline, WorkloadClass } from './words';

/** What a set of readings says of itself. Unit: the workload's; percent where the name says so. */
export interface Summary {
	/** Readings counted: those not excluded, of runs not voided. */
	n: number;
	mean: number;
	median: number;
	min: number;
	max: number;
	/** Sample standard deviation, n − 1 below; null for one reading. */
	sd: number | null;
	/** Coefficient of variation; null for one reading or a mean that is not positive. */
	cvPercent: number | null;
	/** Student t interval of the mean; null for one reading. */
	ci95: [number, number] | null;
	/** Indices, into the readings given, of those that stand far from the others (flag only). */
	flagged: number[];
	/** The average the workload's protocol puts in print. */
	headline: number;
	/**
	 * Standard error of the logarithm of the median (Price & Bonett); null where the readings give none. Left out of
	 * editions from before it was taken.
	 */
	medianLogError?: number | null;
}

export const verdicts = ['better', 'worse', 'no-difference', 'not-enough'] as const;
export type Verdict = (typeof verdicts)[number];

export const verdictWords: Record<Verdict, string> = {
	better: 'better',
	worse: 'worse',
	'no-difference': 'no difference that matters',
	'not-enough': 'not enough runs to say'
};

/** A cell against its baseline, turned so that above 1 is better. Of medians where the protocol prints the median. */
export interface Comparison {
	ratio: number;
	/** 95 % interval of the ratio; null where the readings allow none. */
	ci95: [number, number] | null;
	/** (ratio − 1) × 100. */
	gainPercent: number;
	gainCi95: [number, number] | null;
	/** What is printed: the verdict once all comparisons of the table are read together (Holm). */
	verdict: Verdict;
	/** The verdict of this comparison by itself. Left out of editions from before the correction. */
	alone?: Verdict;
}

/** A cell against its baseline where a ratio says nothing, turned so that above zero is better. Unit: the workload's. */
export interface Difference {
	difference: number;
	/** Welch's 95 % interval; null with a single reading on a side. */
	ci95: [number, number] | null;
	/** The least difference that matters, as its share of the baseline's mean. */
	least: number;
	verdict: Verdict;
	alone: Verdict;
	/** Why no ratio, in one sentence. */
	why: string;
}

/** The geometric mean of a profile's ratios in the workloads that measure performance. */
export interface Overall {
	ratio: number;
	gainPercent: number;
	/** 95 % interval of the ratio; null where the readings allow none, left out of older editions. */
	ci95?: [number, number] | null;
	gainCi95?: [number, number] | null;
	/** Workloads that went into it. */
	workloads: string[];
	/** Performance workloads of the campaign that could not, for want of readings on a side or of a ratio. */
	missing: string[];
	/**
	 * Workloads left out on purpose, with the cost that they measure. Not there in editions from before costs were
	 * left out, whose figure rests on every ratio.
	 */
	aside?: { workload: string; cost: CostKind }[];
}

export interface CellFigures {
	profile: string;
	workload: string;
	/** Readings the plan asks for. */
	needed: number;
	/** Null while the cell is empty. */
	summary: Summary | null;
	/** Null for the baseline itself, where a side is empty, or where a ratio says nothing. */
	comparison: Comparison | null;
	/** In the place of a comparison where a ratio says nothing. Left out of older editions. */
	difference?: Difference | null;
	signedBy: string | null;
	/** ISO time. */
	signedAt: string | null;
	testers: string[];
	/** First and last start of its runs, ISO. */
	from: string | null;
	to: string | null;
	ambientC: number | null;
}

export interface WorkloadFacts {
	slug: string;
	name: string;
	programVersion: string;
	settings: string;
	quantity: string;
	unit: string;
	better: Direction;
	class: WorkloadClass;
	headline: Headline;
	leastDifferencePercent: number;
	warmUps: number;
	repeats: number;
	coolDownS: number;
}
