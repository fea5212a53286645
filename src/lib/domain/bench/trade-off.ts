import { type CostKind, costOf } from './cost-of';
import type { CellFigures, Overall, Summary, Verdict, WorkloadFacts } from './figures';
import { overallAgainst } from './held-against';
import { compareDifference } from './statistics/difference';
import type { WorkloadClass } from './words';

/** The classes of work a strategy is weighed by; stress tests wear a rig out and are nobody's work. */
export const workClasses = [
	'light-threaded',
	'all-core',
	'game',
	'memory'
] as const satisfies WorkloadClass[];
export type WorkClass = (typeof workClasses)[number];

/** What a trade-off is made from: a campaign with every cell already held against the baseline. */
export interface TradeOffInput {
	profiles: { slug: string; name: string }[];
	workloads: WorkloadFacts[];
	cells: CellFigures[];
	baseline: string;
}

/** One workload of a profile, as its verdict in the comparison has it. */
export interface Standing {
	workload: string;
	name: string;
	/** Null where there is nothing to compare. */
	verdict: Verdict | null;
	gainPercent: number | null;
	gainCi95: [number, number] | null;
}

export interface ClassStanding {
	class: WorkClass;
	/** Geometric mean of the class's ratios; null where none was measured on both sides. */
	overall: Overall | null;
	of: Standing[];
}

export interface CostStanding extends Standing {
	kind: CostKind;
	unit: string;
	summary: Summary | null;
	/** Profile less baseline in the unit, not turned; null where a side is empty or for the baseline itself. */
	more: number | null;
	moreCi95: [number, number] | null;
}

export interface ProfileTradeOff {
	profile: string;
	name: string;
	classes: ClassStanding[];
	costs: CostStanding[];
}

const cellOf = (input: TradeOffInput, profile: string, workload: string): CellFigures | undefined =>
	input.cells.find((cell) => cell.profile === profile && cell.workload === workload);

function standing(input: TradeOffInput, profile: string, workload: WorkloadFacts): Standing {
	const cell = cellOf(input, profile, workload.slug);
	return {
		workload: workload.slug,
		name: workload.name,
		verdict: (cell?.comparison ?? cell?.difference)?.verdict ?? null,
		gainPercent: cell?.comparison?.gainPercent ?? null,
		gainCi95: cell?.comparison?.gainCi95 ?? null
	};
}

function classOf(input: TradeOffInput, profile: string, kind: WorkClass): ClassStanding {
	const workloads = input.workloads.filter((one) => one.class === kind && costOf(one.unit) === null);
	const slugs = new Set(workloads.map((one) => one.slug));
	const cells = input.cells.filter((cell) => slugs.has(cell.workload));
	return {
		class: kind,
		overall: profile === input.baseline ? null : overallAgainst(cells, workloads, profile, input.baseline),
		of: workloads.map((workload) => standing(input, profile, workload))
	};
}

function costStanding(
	input: TradeOffInput,
	profile: string,
	workload: WorkloadFacts,
	kind: CostKind
): CostStanding {
	const summary = cellOf(input, profile, workload.slug)?.summary ?? null;
	const against =
		profile === input.baseline ? null : (cellOf(input, input.baseline, workload.slug)?.summary ?? null);
	const held = summary && against ? compareDifference(summary, against, 'higher', 0) : null;
	return {
		...standing(input, profile, workload),
		kind,
		unit: workload.unit,
		summary,
		more: held?.difference ?? null,
		moreCi95: held?.ci95 ?? null
	};
}

/**
 * What each profile of a campaign gains and costs: the geometric mean over the baseline in each class of work, and
 * power, energy, temperature and noise as they are and as they differ. The baseline comes with its own costs.
 */
export const tradeOffs = (input: TradeOffInput): ProfileTradeOff[] =>
	input.profiles.map(({ slug, name }) => ({
		profile: slug,
		name,
		classes: workClasses
			.map((kind) => classOf(input, slug, kind))
			.filter((standings) => standings.of.length > 0),
		costs: input.workloads.flatMap((workload) => {
			const kind = costOf(workload.unit);
			return kind === null ? [] : [costStanding(input, slug, workload, kind)];
		})
	}));
