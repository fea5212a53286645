import { costWords } from '../bench/cost-of';
import { tradeOffs, type CostStanding, type ProfileTradeOff } from '../bench/trade-off';
import { workWords } from '../bench/trade-off-words';
import { verdictCounts } from '../bench/verdict-counts';
import type { Overall } from '../bench/figures';
import {
	halfWidthOf,
	printedGain,
	printedGainRange,
	printedRange,
	printedSigned,
	withUnit
} from '../shared/quantity';
import { cellsOver, overallOver } from './against';
import { capital } from './directives/containers';
import type { CampaignData } from './data';
import type { UsedCell } from './directives/shape';

/** One thing a profile is weighed by, as it is printed; `printed` is empty where nothing could be compared. */
export interface WeighedRow {
	name: string;
	printed: string;
	interval: string;
	verdict: string;
}

/** Every profile of a campaign held against one of them, in the campaign's order. */
export const weighedAgainst = (campaign: CampaignData, over: string): ProfileTradeOff[] =>
	tradeOffs({ ...campaign, cells: cellsOver(campaign, over), baseline: over }).filter(
		({ profile }) => profile !== over
	);

const ofFigure = (figure: Overall | null): Pick<WeighedRow, 'printed' | 'interval'> => ({
	printed: figure ? printedGain(figure.gainPercent, figure.gainCi95) : '',
	interval: figure?.gainCi95 ? printedGainRange(figure.gainCi95) : ''
});

function costRow({ name, kind, unit, more, moreCi95, verdict }: CostStanding): WeighedRow {
	const precision = { halfWidth: halfWidthOf(moreCi95) };
	return {
		name: `${capital(costWords[kind])}: ${name}`,
		printed: more === null ? '' : withUnit(printedSigned(more, precision), unit),
		interval: moreCi95 ? withUnit(printedRange(moreCi95, precision, { signed: true }), unit) : '',
		verdict: verdictCounts([verdict])
	};
}

/** What one profile gains and costs against another: over everything, by class of work, and each of its costs. */
export function weighedRows(campaign: CampaignData, side: ProfileTradeOff, over: string): WeighedRow[] {
	const { classes, costs, profile } = side;
	const all = classes.flatMap(({ of }) => of.map(({ verdict }) => verdict));
	return [
		{
			name: 'Overall',
			...ofFigure(overallOver(campaign, profile, over)),
			verdict: verdictCounts([...all, ...costs.map(({ verdict }) => verdict)])
		},
		...classes.map(({ class: kind, overall, of }) => ({
			name: capital(workWords[kind]),
			...ofFigure(overall),
			verdict: verdictCounts(of.map(({ verdict }) => verdict))
		})),
		...costs.map(costRow)
	];
}

/** The measured cells of some profiles of a campaign. */
export const cellsOfProfiles = (campaign: CampaignData, profiles: readonly string[]): UsedCell[] =>
	campaign.cells
		.filter((cell) => cell.summary !== null && profiles.includes(cell.profile))
		.map(({ profile, workload }) => ({ campaign: campaign.slug, profile, workload }));
