import { precisionOf } from '../figures-in-words';
import { comparisonOver, overallOver } from '../against';
import type { ArticleData } from '../data';
import { printed, printedGain, printedGainRange, printedRange, withUnit } from '../../shared/quantity';
import { front, type Datum, type Held } from './datum';

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

/** Averages and spreads of every measured cell. */
export function readings(data: ArticleData): Datum[] {
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

/** Every gain over a profile; over each campaign's baseline for null. */
export function gains(data: ArticleData, over: string | null): Held[] {
	return [...cellsOf(data)].flatMap(({ campaign, workload, profile }): Held[] => {
		const base = over ?? campaign.baseline;
		const comparison = comparisonOver(campaign, workload, profile.slug, base);
		if (!comparison) return [];
		const { ratio, gainPercent, gainCi95 } = comparison;
		const lowerIsBetter = workload.better === 'lower';
		const against = campaign.profiles.find((one) => one.slug === base);
		const overWords = base === campaign.baseline || !against ? '' : ` over ${front(against.name)}`;
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
				name: `${workload.name}, ${front(profile.name)}${overWords}`,
				printed: printedGain(gainPercent, gainCi95),
				range: gainCi95 && printedGainRange(gainCi95),
				ratio,
				quotient: lowerIsBetter ? 1 / ratio : ratio,
				lowerIsBetter
			}
		];
	});
}

/** Every overall gain over a profile. */
export function overalls(data: ArticleData, over: string | null): Held[] {
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

/** Averages less those of what they are held against, in their own unit. */
export function differences(data: ArticleData, averages: readonly Datum[], over: string | null): Datum[] {
	const key = (one: Datum, profile: string | null) =>
		`${one.campaign}/${one.workload ?? ''}/${profile ?? ''}`;
	const byCell = new Map([...averages].reverse().map((one) => [key(one, one.profile), one]));
	const baselines = new Map(data.campaigns.map((one) => [one.slug, one.baseline]));
	return averages.flatMap((one): Datum[] => {
		const other = byCell.get(key(one, over ?? baselines.get(one.campaign) ?? null));
		if (!other || other.profile === one.profile) return [];
		const value = Number((one.value - other.value).toPrecision(12));
		const halfWidth = one.interval ? (one.interval[1] - one.interval[0]) / 2 : null;
		const text = withUnit(printed(value, { halfWidth }), one.unit);
		return [
			{ ...one, kind: 'difference', value, interval: null, range: null, over: other.profile, printed: text }
		];
	});
}
