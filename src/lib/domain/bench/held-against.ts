import { costOf } from './cost-of';
import type { CellFigures, Comparison, Difference, Overall, Summary, WorkloadFacts } from './figures';
import { comparable } from './statistics/comparable';
import { testSummaries, type TestedComparison } from './statistics/compare';
import { type Question, verdictsTogether } from './statistics/compare-many';
import { compareDifference } from './statistics/difference';
import { overall } from './statistics/overall';
import { overallInterval } from './statistics/overall-interval';
import { testMedians } from './statistics/robust';
import type { Spread } from './statistics/sides';

type Cell = Pick<CellFigures, 'profile' | 'workload' | 'summary'>;
export type HeldWorkload = Pick<
	WorkloadFacts,
	'slug' | 'unit' | 'better' | 'headline' | 'leastDifferencePercent'
>;

/** A cell's standing: a ratio, a difference where a ratio says nothing, or neither where a side is empty. */
export interface Standing {
	comparison: Comparison | null;
	difference: Difference | null;
}

export type Tested = Standing & Question;

/** The error of a set's median, where the workload prints the median and the error was taken. */
const medianError = ({ medianLogError }: Summary, { headline }: HeldWorkload) =>
	headline === 'median' ? medianLogError : undefined;

function ratioOf(subject: Summary, baseline: Summary, workload: HeldWorkload): TestedComparison {
	const { better, leastDifferencePercent } = workload;
	const [ours, theirs] = [medianError(subject, workload), medianError(baseline, workload)];
	return ours === undefined || theirs === undefined || !(subject.median > 0 && baseline.median > 0)
		? testSummaries(subject, baseline, better, leastDifferencePercent)
		: testMedians(
				{ median: subject.median, logError: ours },
				{ median: baseline.median, logError: theirs },
				better,
				leastDifferencePercent
			);
}

const nothing: Tested = { comparison: null, difference: null, p: null, forBetter: false };

/** One cell against its baseline, alone: a ratio or a difference, with the p value that Holm's correction takes. */
export function testCell(subject: Summary, baseline: Summary, workload: HeldWorkload): Tested {
	const { by, why } = comparable(workload.unit, [subject.mean, baseline.mean]);
	if (by === 'ratio') {
		const { comparison, p } = ratioOf(subject, baseline, workload);
		return {
			comparison: { ...comparison, alone: comparison.verdict },
			difference: null,
			p,
			forBetter: comparison.ratio > 1
		};
	}
	const least = (Math.abs(baseline.mean) * workload.leastDifferencePercent) / 100;
	const { p, ...held } = compareDifference(subject, baseline, workload.better, least);
	return {
		comparison: null,
		difference: { ...held, least, alone: held.verdict, why },
		p,
		forBetter: held.difference > 0
	};
}

/**
 * Every cell of a table against the baseline's cell of the same workload, in the order given: by the average that the
 * workload prints, as a ratio or, where that says nothing, as a difference; each verdict after Holm's correction over
 * the whole table. The baseline's own cells have neither.
 * @param test may be one that remembers what it worked out
 */
export function heldAgainst(
	cells: readonly Cell[],
	workloads: readonly HeldWorkload[],
	baseline: string,
	test = testCell
): Standing[] {
	const rules = new Map(workloads.map((workload) => [workload.slug, workload]));
	const baselines = new Map(
		cells.filter((cell) => cell.profile === baseline).map((cell) => [cell.workload, cell.summary])
	);
	const tested = cells.map(({ profile, workload, summary }) => {
		const rule = rules.get(workload);
		const against = baselines.get(workload);
		return rule && summary && against && profile !== baseline ? test(summary, against, rule) : nothing;
	});
	const together = verdictsTogether(tested);
	return tested.map(({ comparison, difference }, at) => {
		const verdict = together[at]?.verdict ?? 'not-enough';
		return {
			comparison: comparison && { ...comparison, verdict },
			difference: difference && { ...difference, verdict }
		};
	});
}

/** How many comparisons of a table were tested, and so corrected for each other. */
export const comparedTogether = (
	standings: readonly Pick<CellFigures, 'comparison' | 'difference'>[]
): number =>
	standings.filter(({ comparison, difference }) => (comparison ?? difference)?.ci95 != null).length;

/** A set as its printed average enters the overall figure: for a median, the scatter that its error stands for. */
function spreadOf(summary: Summary, workload: HeldWorkload): Spread {
	const error = medianError(summary, workload);
	if (error === undefined) return summary;
	const sd = error === null ? null : error * summary.median * Math.sqrt(summary.n);
	return { n: summary.n, mean: summary.median, sd };
}

/**
 * A profile's geometric mean over the baseline with its 95 % interval, of the workloads that measure performance:
 * scores, rates and times. What a profile costs (power, noise, money …) is no part of how fast it is, and is named as
 * left aside. Null where no such workload has a ratio.
 * @param cells with their comparisons; other profiles among them but the baseline are left aside
 */
export function overallAgainst(
	cells: readonly (Cell & { comparison: Comparison | null })[],
	workloads: readonly HeldWorkload[],
	profile: string,
	baseline: string
): Overall | null {
	const costs = new Map(workloads.map(({ slug, unit }) => [slug, costOf(unit)]));
	const own = cells.filter((cell) => cell.profile === profile);
	const counted = own.filter(({ workload }) => (costs.get(workload) ?? null) === null);
	const figure = overall(counted);
	if (!figure) return null;
	const aside = own.flatMap(({ workload }) => {
		const cost = costs.get(workload) ?? null;
		return cost === null ? [] : [{ workload, cost }];
	});
	const inputs = counted.flatMap(({ workload, summary, comparison }) => {
		const rule = workloads.find((one) => one.slug === workload);
		const against = cells.find((cell) => cell.profile === baseline && cell.workload === workload)?.summary;
		return rule && comparison && summary && against
			? [{ subject: spreadOf(summary, rule), baseline: spreadOf(against, rule), better: rule.better }]
			: [];
	});
	const ci95 = overallInterval(inputs)?.ci95 ?? null;
	return { ...figure, aside, ci95, gainCi95: ci95 && [(ci95[0] - 1) * 100, (ci95[1] - 1) * 100] };
}
