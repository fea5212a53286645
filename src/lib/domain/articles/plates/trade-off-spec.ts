import { costWords } from '../../bench/cost-of';
import { tradeOffs, type ProfileTradeOff } from '../../bench/trade-off';
import { workWords } from '../../bench/trade-off-words';
import { printedGain, printedGainRange } from '../../shared/quantity';
import type { ArticleData, CampaignData } from '../data';
import { figuresOf } from '../directives/lookup';
import { rigAndDates } from './foot';
import { overallPoint } from './overall-spec';
import { seriesOf } from './series';
import type { GainPoint, GainsRow, TradeOffSpec } from './spec';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

function costPoint(campaign: CampaignData, profile: string, workload: string): GainPoint | null {
	const cell = figuresOf(campaign, profile, workload);
	const comparison = cell?.comparison;
	if (!comparison) return null;
	return {
		profile,
		gainPercent: comparison.gainPercent,
		ci95: comparison.gainCi95,
		ratio: comparison.ratio,
		n: cell.summary?.n ?? 0,
		nBaseline: figuresOf(campaign, campaign.baseline, workload)?.summary?.n ?? 0,
		verdict: comparison.verdict,
		printed: printedGain(comparison.gainPercent, comparison.gainCi95),
		printedInterval: comparison.gainCi95 && printedGainRange(comparison.gainCi95)
	};
}

function rowsOf(campaign: CampaignData, sides: ProfileTradeOff[]): GainsRow[] {
	const [first] = sides;
	const classes = (first?.classes ?? []).map(({ class: kind, of }, at): GainsRow => ({
		workload: kind,
		name: capital(workWords[kind]),
		kind: `${of.length} workload${of.length === 1 ? '' : 's'}`,
		leastDifferencePercent: null,
		points: sides.map(({ profile, classes: own }) => {
			const figure = own[at]?.overall;
			return figure ? overallPoint(profile, figure) : null;
		})
	}));
	const costs = (first?.costs ?? []).map(({ workload, name, kind }): GainsRow => ({
		workload,
		name,
		kind: costWords[kind],
		leastDifferencePercent:
			campaign.workloads.find((one) => one.slug === workload)?.leastDifferencePercent ?? null,
		points: sides.map(({ profile }) => costPoint(campaign, profile, workload))
	}));
	return [...classes, ...costs].filter((row) => row.points.some((point) => point !== null));
}

/**
 * What each profile gains over the campaign's baseline by class of work, and what it saves or costs, on one zero line.
 * Null where nothing was measured on both sides. Costs that only a difference can hold (degrees, decibels) are not on it.
 */
export function tradeOffSpec(
	campaign: CampaignData,
	{ zone }: Pick<ArticleData, 'zone'>,
	options: { profiles?: string[]; subject?: string; title?: string } = {}
): TradeOffSpec | null {
	const numbers = seriesOf(campaign, options.subject);
	const over = campaign.profiles.find((one) => one.slug === campaign.baseline);
	const sides = tradeOffs(campaign).filter(
		({ profile }) => profile !== campaign.baseline && (options.profiles?.includes(profile) ?? true)
	);
	const rows = rowsOf(campaign, sides);
	if (!over || rows.length === 0) return null;
	const workloads = [
		...new Set(
			sides.flatMap(({ classes, costs }) => [
				...classes.flatMap(({ overall }) => overall?.workloads ?? []),
				...costs.filter(({ gainPercent }) => gainPercent !== null).map(({ workload }) => workload)
			])
		)
	];
	const shown = new Set([campaign.baseline, ...sides.map(({ profile }) => profile)]);
	return {
		kind: 'trade-off',
		campaign: campaign.slug,
		title:
			options.title ??
			`What each gains and costs against ${over.name.toLowerCase() === 'stock' ? 'stock' : over.name}`,
		sub: 'Percent; right is better, for power and noise too.',
		baseline: { profile: over.slug, name: over.name },
		series: sides.map(({ profile, name }) => ({ profile, name, series: numbers.get(profile) ?? 1 })),
		rows,
		workloads,
		foot: [
			'Classes of work are geometric means of the workloads that measure performance; costs stand by themselves. Whiskers are 95 % intervals.',
			rigAndDates(
				campaign,
				campaign.cells.filter((cell) => shown.has(cell.profile) && workloads.includes(cell.workload)),
				zone
			)
		]
	};
}
