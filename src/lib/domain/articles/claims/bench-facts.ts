import { precisionOf } from '../figures-in-words';
import { comparisonOver, overallOver } from '../against';
import type { ArticleData, CampaignData } from '../data';
import { sweepReport } from '../../bench/stability/sweep-facts';
import { currencyDigits, formatMoney } from '../../shared/money';
import { printed, printedGain, printedGainRange, printedRange, withUnit } from '../../shared/quantity';
import { lexiconOf, type Lexicon } from './names';
import { methodFacts, settingFacts } from './setting-facts';
import { unitReader, type UnitReader } from './prose-units';

export type DatumKind =
	| 'reading'
	| 'spread'
	| 'gain'
	| 'change'
	| 'overall'
	| 'difference'
	| 'setting'
	| 'method'
	| 'price'
	| 'ambient'
	| 'switch-point';

/** One stored or derived value that a number in prose may be. */
export interface Datum {
	kind: DatumKind;
	value: number;
	unit: string;
	interval: [number, number] | null;
	/** Slugs, where they apply. */
	campaign: string;
	workload: string | null;
	profile: string | null;
	over: string | null;
	/** Names of a setting or a part, as people call it. */
	called: string | null;
	/** What it is of, for a note. @example 'Prime sieve, Fixed 4.95' */
	name: string;
	/** As print would have it, and its interval. */
	printed: string;
	range: string | null;
}

/** A gain with its ratio, turned so that above 1 is better, and the quantity's own change. */
export interface Held extends Datum {
	ratio: number;
	/** Profile over baseline in the workload's own quantity. */
	quotient: number;
	lowerIsBetter: boolean;
}

/** A name without what stands behind its comma, for a note. */
export const front = (name: string): string => name.split(/,(?!\d)/)[0] ?? name;

function* cellsOf(data: ArticleData) {
	for (const campaign of data.campaigns) {
		const workloads = new Map(campaign.workloads.map((one) => [one.slug, one]));
		const profiles = new Map(campaign.profiles.map((one) => [one.slug, one]));
		for (const cell of campaign.cells) {
			const workload = workloads.get(cell.workload);
			const profile = profiles.get(cell.profile);
			if (workload && profile) yield { campaign, workload, profile, cell };
		}
	}
}

function readings(data: ArticleData): Datum[] {
	return [...cellsOf(data)].flatMap(({ campaign, workload, profile, cell: { summary } }): Datum[] => {
		if (!summary) return [];
		const precision = precisionOf(summary);
		const base = {
			campaign: campaign.slug,
			workload: workload.slug,
			profile: profile.slug,
			over: null,
			called: null,
			name: `${workload.name}, ${front(profile.name)}`
		};
		const reading = (value: number): Datum => ({
			...base,
			kind: 'reading',
			value,
			unit: workload.unit,
			interval: summary.ci95,
			printed: withUnit(printed(value, precision), workload.unit),
			range: summary.ci95 && printedRange(summary.ci95, precision)
		});
		const averages = [...new Set([summary.headline, summary.mean, summary.median])].map(reading);
		if (summary.cvPercent === null) return averages;
		const spread = withUnit(printed(summary.cvPercent, { decimals: 1 }), '%');
		return [
			...averages,
			{
				...base,
				kind: 'spread',
				value: summary.cvPercent,
				unit: '%',
				interval: null,
				printed: spread,
				range: null
			}
		];
	});
}

function gains(data: ArticleData, over: string | null): Held[] {
	return [...cellsOf(data)].flatMap(({ campaign, workload, profile }): Held[] => {
		const base = over ?? campaign.baseline;
		const comparison = comparisonOver(campaign, workload, profile.slug, base);
		if (!comparison) return [];
		const { ratio, gainPercent, gainCi95 } = comparison;
		const lowerIsBetter = workload.better === 'lower';
		const against = campaign.profiles.find((one) => one.slug === base);
		const over_ = base === campaign.baseline || !against ? '' : ` over ${front(against.name)}`;
		return [
			{
				kind: 'gain',
				value: gainPercent,
				unit: '%',
				interval: gainCi95,
				campaign: campaign.slug,
				workload: workload.slug,
				profile: profile.slug,
				over: base,
				called: null,
				name: `${workload.name}, ${front(profile.name)}${over_}`,
				printed: printedGain(gainPercent, gainCi95),
				range: gainCi95 && printedGainRange(gainCi95),
				ratio,
				quotient: lowerIsBetter ? 1 / ratio : ratio,
				lowerIsBetter
			}
		];
	});
}

function overalls(data: ArticleData, over: string | null): Held[] {
	return data.campaigns.flatMap((campaign) =>
		campaign.profiles.flatMap((profile): Held[] => {
			const base = over ?? campaign.baseline;
			const figure = profile.slug === base ? null : overallOver(campaign, profile.slug, base);
			if (!figure) return [];
			return [
				{
					kind: 'overall',
					value: figure.gainPercent,
					unit: '%',
					interval: figure.gainCi95 ?? null,
					campaign: campaign.slug,
					workload: null,
					profile: profile.slug,
					over: base,
					called: null,
					name: `Overall, ${front(profile.name)}`,
					printed: printedGain(figure.gainPercent),
					range: figure.gainCi95 ? printedGainRange(figure.gainCi95) : null,
					ratio: figure.ratio,
					quotient: figure.ratio,
					lowerIsBetter: false
				}
			];
		})
	);
}

const plain = (campaign: CampaignData) => ({
	campaign: campaign.slug,
	workload: null,
	profile: null,
	over: null,
	interval: null,
	range: null
});

function prices(data: ArticleData): Datum[] {
	return data.campaigns.flatMap((campaign) => {
		const lines = campaign.kit.flatMap(({ partName, price }) => (price ? [{ partName, ...price }] : []));
		const sums = new Map<string, number>();
		for (const { currency, amountMinor } of lines)
			sums.set(currency, (sums.get(currency) ?? 0) + amountMinor);
		const all = [
			...lines.map(({ partName, currency, amountMinor }) => ({ partName, currency, amountMinor })),
			...[...sums].map(([currency, amountMinor]) => ({ partName: 'The kit', currency, amountMinor }))
		];
		return all.map(({ partName, currency, amountMinor }): Datum => ({
			...plain(campaign),
			kind: 'price',
			value: Number(`${amountMinor}e-${currencyDigits(currency)}`),
			unit: currency,
			called: front(partName),
			name: front(partName),
			printed: formatMoney(amountMinor, currency)
		}));
	});
}

function ambients(data: ArticleData): Datum[] {
	return data.campaigns.flatMap((campaign) => {
		const values = campaign.cells.flatMap((cell) => (cell.ambientC === null ? [] : [cell.ambientC]));
		if (values.length === 0) return [];
		const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
		return [...new Set([mean, ...values])].map((value): Datum => ({
			...plain(campaign),
			kind: 'ambient',
			value,
			unit: '°C',
			called: 'ambient',
			name: 'Ambient of these runs',
			printed: withUnit(printed(value, { decimals: 1 }), '°C')
		}));
	});
}

function switchPoints(data: ArticleData): Datum[] {
	return (data.sweeps ?? []).flatMap((sweep): Datum[] => {
		const point = sweepReport(sweep)?.point;
		if (!point || point.crossingA === null) return [];
		const { crossingA, ci95, setA } = point;
		const halfWidth = ci95 ? (ci95[1] - ci95[0]) / 2 : null;
		return [crossingA, ...(setA === null ? [] : [setA])].map((value) => ({
			kind: 'switch-point',
			value,
			unit: 'A',
			interval: ci95,
			campaign: '',
			workload: null,
			profile: sweep.profile.slug,
			over: null,
			called: 'switch point',
			name: `Switch point, ${front(sweep.profile.name)}`,
			printed: withUnit(printed(value, { halfWidth }), 'A'),
			range: ci95 && printedRange(ci95)
		}));
	});
}

/** Everything the claims of an article are held against, made once for its data. */
export class BenchFacts {
	readonly lexicon: Lexicon;
	readonly units: UnitReader;
	readonly readings: Datum[];
	/** Settings, derived facts, switch points, ambient: what is so, and not how fast. */
	readonly others: Datum[];
	readonly methods: Datum[];
	readonly prices: Datum[];
	private readonly gainsOver = new Map<string | null, Held[]>();
	private readonly overallsOver = new Map<string | null, Held[]>();

	constructor(readonly data: ArticleData) {
		this.lexicon = lexiconOf(data);
		this.units = unitReader(data.campaigns.flatMap((one) => one.workloads.map(({ unit }) => unit)));
		this.readings = readings(data);
		this.others = [...settingFacts(data), ...switchPoints(data), ...ambients(data)];
		this.methods = methodFacts(data, this.units);
		this.prices = prices(data);
	}

	/** Gains over a profile; over each campaign's baseline for null. */
	gains(over: string | null): Held[] {
		const known = this.gainsOver.get(over) ?? gains(this.data, over);
		this.gainsOver.set(over, known);
		return known;
	}

	overalls(over: string | null): Held[] {
		const known = this.overallsOver.get(over) ?? overalls(this.data, over);
		this.overallsOver.set(over, known);
		return known;
	}
}

const made = new WeakMap<ArticleData, BenchFacts>();

/** The facts of an article's data, kept as long as the data. */
export function benchFacts(data: ArticleData): BenchFacts {
	const known = made.get(data) ?? new BenchFacts(data);
	made.set(data, known);
	return known;
}
