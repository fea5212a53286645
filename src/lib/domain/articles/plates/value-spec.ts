import type { ValueFigures } from '../../bench/value-figures';
import { halfWidthOf, printed, printedRange, withUnit } from '../../shared/quantity';
import type { ArticleData, CampaignData } from '../data';
import { countsInWords, rigAndDates } from './foot';
import { seriesOf } from './series';
import type { BarRow, ValueSpec } from './spec';

const titles = { energy: 'energy of a run', watt: 'for each watt', price: 'for the money' } as const;

/** A figure made of two, as bars, best first. Null where no profile has both. */
export function valueSpec(
	campaign: CampaignData,
	figures: ValueFigures,
	{ zone }: Pick<ArticleData, 'zone'>,
	options: { profiles?: string[]; subject?: string; title?: string } = {}
): ValueSpec | null {
	const series = seriesOf(campaign, options.subject);
	const rows = figures.rows
		.filter(({ profile }) => options.profiles?.includes(profile) ?? true)
		.map(({ profile, name, figure: { value, ci95 }, n }): BarRow => {
			const precision = { halfWidth: halfWidthOf(ci95) };
			return {
				profile,
				name,
				series: series.get(profile) ?? 1,
				value,
				ci95,
				n,
				printed: withUnit(printed(value, precision), figures.unit),
				printedInterval: ci95 && withUnit(printedRange(ci95, precision), figures.unit)
			};
		})
		.sort((a, b) => (figures.better === 'higher' ? b.value - a.value : a.value - b.value));
	if (rows.length === 0) return null;
	const shown = new Set(rows.map(({ profile }) => profile));
	return {
		kind: 'value',
		per: figures.kind,
		campaign: campaign.slug,
		workload: figures.workload,
		title: options.title ?? `${figures.name}, ${titles[figures.kind]}`,
		sub: `In ${figures.unit}; ${figures.better === 'higher' ? 'longer' : 'shorter'} is better.`,
		unit: figures.unit,
		better: figures.better,
		how: figures.how,
		from: figures.from,
		rows,
		foot: [
			`${figures.how}; ${countsInWords(rows.map(({ n }) => n))}; whiskers are 95 % intervals.`,
			rigAndDates(
				campaign,
				campaign.cells.filter((cell) => shown.has(cell.profile) && figures.from.includes(cell.workload)),
				zone
			)
		]
	};
}
