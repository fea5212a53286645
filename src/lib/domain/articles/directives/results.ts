import { verdictWords } from '../../bench/figures';
import { printed, printedGain, printedPercent, printedRange } from '../../shared/quantity';
import { comparisonOver } from '../against';
import { precisionOf } from '../figures-in-words';
import { element, table } from '../html';
import { namesNear } from '../names-near';
import type { CampaignData, ProfileFacts } from '../data';
import { attribute, figuresOf, findBaseline, findCampaign } from './lookup';
import { directive, found, missing, type UsedCell } from './shape';

interface Results {
	campaign: CampaignData;
	over: ProfileFacts;
	rows: string[][];
	cells: UsedCell[];
}

function rowsOf(
	campaign: CampaignData,
	over: ProfileFacts,
	only: string | undefined
): Pick<Results, 'rows' | 'cells'> {
	const rows: string[][] = [];
	const cells: UsedCell[] = [];
	for (const workload of campaign.workloads) {
		if (only !== undefined && workload.slug !== only) continue;
		for (const profile of campaign.profiles) {
			const summary = figuresOf(campaign, profile.slug, workload.slug)?.summary;
			if (!summary) {
				rows.push([`${workload.name}, ${workload.unit}`, profile.name, '0', 'not measured', '', '', '', '']);
				continue;
			}
			const comparison = comparisonOver(campaign, workload, profile.slug, over.slug);
			const precision = precisionOf(summary);
			cells.push({ campaign: campaign.slug, profile: profile.slug, workload: workload.slug });
			rows.push([
				`${workload.name}, ${workload.unit}`,
				profile.name,
				String(summary.n),
				printed(summary.mean, precision),
				summary.ci95 ? printedRange(summary.ci95, precision) : 'none',
				summary.cvPercent === null ? 'none' : printedPercent(summary.cvPercent),
				comparison ? printedGain(comparison.gainPercent, comparison.gainCi95) : '',
				comparison ? verdictWords[comparison.verdict] : profile.slug === over.slug ? 'held against' : ''
			]);
		}
	}
	return { rows, cells };
}

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
			return missing(`${campaign.value.name} has no workload called “${only}”.`, namesNear(only, known));
		}
		const { rows, cells } = rowsOf(campaign.value, over.value, only);
		return cells.length === 0
			? missing(`${campaign.value.name} has no readings yet, so there is no table to print.`)
			: found({ campaign: campaign.value, over: over.value, rows, cells });
	},
	render: ({ campaign, over, rows, cells }, { call }) => ({
		html: element(
			'div',
			{ class: 'results', 'data-line': call.line },
			table(
				`Results of ${campaign.name}. Gains are over ${over.name}, turned so that more is better.`,
				[
					{ head: 'Workload' },
					{ head: 'Profile' },
					{ head: 'n', figures: true },
					{ head: 'Mean', figures: true },
					{ head: '95 % interval', figures: true },
					{ head: 'Variation', figures: true },
					{ head: 'Gain', figures: true },
					{ head: 'Verdict' }
				],
				rows
			)
		),
		plain: `Results of ${campaign.name}`,
		cells
	})
});
