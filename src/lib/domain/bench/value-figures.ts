import { costOf } from './cost-of';
import type { Summary, WorkloadFacts } from './figures';
import type { Spread } from './statistics/sides';
import {
	type DatedPrice,
	type DerivedFigure,
	energyPerTask,
	scorePerPrice,
	scorePerWatt
} from './statistics/value';
import type { TradeOffInput } from './trade-off';

export const valueKinds = ['energy', 'watt', 'price'] as const;
export type ValueKind = (typeof valueKinds)[number];

export interface ValueRow {
	profile: string;
	name: string;
	figure: DerivedFigure;
	n: number;
}

/** One figure made from two measured ones (or one and a price), for every profile that has both. */
export interface ValueFigures {
	kind: ValueKind;
	workload: string;
	name: string;
	unit: string;
	better: 'higher' | 'lower';
	/** What it is made from, in words. */
	how: string;
	rows: ValueRow[];
	/** The workloads whose readings it rests on. */
	from: string[];
}

/** Seconds in a unit of time; null for any other unit. */
const seconds: Record<string, number> = { ms: 0.001, s: 1, sec: 1, min: 60, h: 3600 };

const watts: Record<string, number> = { mw: 0.001, w: 1, kw: 1000 };

const scaled = ({ n, mean, sd }: Summary, factor: number): Spread => ({
	n,
	mean: mean * factor,
	sd: sd === null ? null : sd * factor
});

type Make = (summary: Summary, profile: string) => DerivedFigure | null;

function rowsOf(input: TradeOffInput, workload: WorkloadFacts, make: Make): ValueRow[] {
	return input.profiles.flatMap(({ slug, name }) => {
		const summary = summaryOf(input, slug, workload.slug);
		const figure = summary && summary.mean > 0 ? make(summary, slug) : null;
		return summary && figure ? [{ profile: slug, name, figure, n: summary.n }] : [];
	});
}

const summaryOf = (input: TradeOffInput, profile: string, workload: string): Summary | null =>
	input.cells.find((cell) => cell.profile === profile && cell.workload === workload)?.summary ?? null;

function withPower(
	input: TradeOffInput,
	workload: WorkloadFacts,
	power: WorkloadFacts
): Omit<ValueFigures, 'rows'> & { make: Make } {
	const toSeconds = seconds[workload.unit.toLowerCase()];
	const toWatts = watts[power.unit.toLowerCase()] ?? 1;
	const energy = toSeconds !== undefined;
	return {
		kind: energy ? 'energy' : 'watt',
		workload: workload.slug,
		name: workload.name,
		unit: energy ? 'J' : `${workload.unit} per W`,
		better: energy ? 'lower' : 'higher',
		how: energy
			? `${power.name} × ${workload.name}, of means; the two were read apart`
			: `${workload.name} ÷ ${power.name}, of means`,
		from: [workload.slug, power.slug],
		make: (summary, profile) => {
			const draw = summaryOf(input, profile, power.slug);
			if (!draw || !(draw.mean > 0)) return null;
			return energy
				? energyPerTask(scaled(draw, toWatts), scaled(summary, toSeconds))
				: scorePerWatt(summary, scaled(draw, toWatts));
		}
	};
}

/**
 * Energy of each timed task and score for each watt, with the power that was measured in the same class of work. Where
 * a class has several measures of power or none, nothing is guessed.
 */
export function perPower(input: TradeOffInput): ValueFigures[] {
	return input.workloads.flatMap((workload) => {
		const powers = input.workloads.filter(
			(one) => costOf(one.unit) === 'power' && one.class === workload.class
		);
		const [power] = powers;
		const timed = workload.unit.toLowerCase() in seconds;
		if (!power || powers.length > 1 || costOf(workload.unit) !== null) return [];
		if (!timed && workload.better !== 'higher') return [];
		const { make, ...facts } = withPower(input, workload, power);
		const rows = rowsOf(input, workload, make);
		return rows.length > 0 ? [{ ...facts, rows }] : [];
	});
}

/** Score for each unit of money, of the workloads whose score is better higher, at a price on a day. */
export function perPrice(input: TradeOffInput, price: DatedPrice, part: string): ValueFigures[] {
	return input.workloads.flatMap((workload) => {
		if (costOf(workload.unit) !== null || workload.better !== 'higher') return [];
		const rows = rowsOf(input, workload, (summary) => scorePerPrice(summary, price));
		if (rows.length === 0) return [];
		return [
			{
				kind: 'price' as const,
				workload: workload.slug,
				name: workload.name,
				unit: `${workload.unit} per ${price.currency}`,
				better: 'higher' as const,
				how: `${workload.name} ÷ the price of ${part}, ${price.amount} ${price.currency} on ${price.date}; the price is taken as exact`,
				rows,
				from: [workload.slug]
			}
		];
	});
}
