import { verdictWords, type WorkloadFacts } from '../../bench/figures';
import { printed, printedGain, printedPercent, printedRange } from '../../shared/quantity';
import { comparisonOver } from '../against';
import { precisionOf } from '../figures-in-words';
import { element, table, type RowGroup } from '../html';
import { unknownName } from '../names-near';
import type { CampaignData, ProfileFacts } from '../data';
import { attribute, figuresOf, findBaseline, findCampaign } from './lookup';
import { directive, found, missing, type UsedCell } from './shape';

interface Results {
	campaign: CampaignData;
	over: ProfileFacts;
	groups: RowGroup[];
	cells: UsedCell[];
}

/** One line of the table: how often, how much, how sure, and against what. */
function lineOf(
	campaign: CampaignData,
	workload: WorkloadFacts,
	profile: ProfileFacts,
	over: string
): string[] {
	const summary = figuresOf(campaign, profile.slug, workload.slug)?.summary;
	if (!summary) return [profile.name, '0', 'not measured', '', '', '', ''];
	const comparison = comparisonOver(campaign, workload, profile.slug, over);
	const precision = precisionOf(summary);
	return [
		profile.name,
		String(summary.n),
		printed(summary.mean, precision),
		summary.ci95 ? printedRange(summary.ci95, precision) : 'none',
		summary.cvPercent === null ? 'none' : printedPercent(summary.cvPercent),
		comparison ? printedGain(comparison.gainPercent, comparison.gainCi95) : '',
		comparison ? verdictWords[comparison.verdict] : profile.slug === over ? 'baseline' : ''
	];
}

function groupsOf(campaign: CampaignData, over: string, only: string | undefined): RowGroup[] {
	return campaign.workloads
		.filter((workload) => only === undefined || workload.slug === only)
		.map((workload) => ({
			head: `${workload.name}, ${workload.unit}, ${workload.better === 'higher' ? 'more' : 'less'} is better`,
			rows: campaign.profiles.map((profile) => lineOf(campaign, workload, profile, over))
		}));
}

const measuredCells = (campaign: CampaignData, only: string | undefined): UsedCell[] =>
	campaign.cells
		.filter((cell) => cell.summary !== null && (only === undefined || cell.workload === only))
		.map(({ profile, workload }) => ({ campaign: campaign.slug, profile, workload }));

/** `::results`: every cell of a campaign as a table. */
export const results = directive<Results>({
	name: 'results',
	level: 'block',
	words: 'A table of every measured cell: n, mean, interval, variation, gain and verdict.',
	attributes: [attribute.campaign(), attribute.over(), attribute.workload(false)],
	resolve(call, data) {
		const campaign = findCampaign(call, data);
		if (!campaign.ok) return campaign;
		const over = findBaseline(call, campaign.value);
		if (!over.ok) return over;
		const only = call.attributes.workload;
		const known = campaign.value.workloads.map((one) => one.slug);
		if (only !== undefined && !known.includes(only)) {
			return unknownName(`${campaign.value.name} has no workload called “${only}”.`, only, known);
		}
		const cells = measuredCells(campaign.value, only);
		return cells.length === 0
			? missing(`${campaign.value.name} has no readings yet, so there is no table to print.`)
			: found({
					campaign: campaign.value,
					over: over.value,
					groups: groupsOf(campaign.value, over.value.slug, only),
					cells
				});
	},
	render: ({ campaign, over, groups, cells }, { call }) => ({
		html: element(
			'div',
			{ class: 'results', 'data-line': call.line },
			table(
				`Results of ${campaign.name}. Gains are over ${over.name}; above nought is better.`,
				[
					{ head: 'Profile' },
					{ head: 'n', figures: true },
					{ head: 'Mean', figures: true },
					{ head: '95 % interval', figures: true },
					{ head: 'Variation', figures: true },
					{ head: 'Gain', figures: true },
					{ head: 'Verdict' }
				],
				groups
			)
		),
		plain: `Results of ${campaign.name}`,
		spoken: `[Table: results of ${campaign.name}]`,
		cells
	})
});
