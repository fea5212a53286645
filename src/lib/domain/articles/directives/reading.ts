import { behindReading, printedAverage, printedInterval } from '../figures-in-words';
import { element, escapeHtml } from '../html';
import { attribute, findCell, type Cell } from './lookup';
import { directive, found, missing } from './shape';

const shows = ['mean', 'median', 'interval'] as const;
type Show = (typeof shows)[number];

/** `:reading{workload= profile=}`: an average of stored readings in a sentence, with its unit. */
export const reading = directive<Cell & { show: Show; text: string }>({
	name: 'reading',
	level: 'inline',
	words: 'A measured value in a sentence, with its unit.',
	attributes: [
		attribute.workload(),
		attribute.profile(),
		attribute.campaign(),
		attribute.oneOf('show', 'which figure; the one the workload prints if left out', shows)
	],
	lasting: true,
	resolve(call, data) {
		const cell = findCell(call, data);
		if (!cell.ok) return cell;
		const { summary, workload } = cell.value;
		const show = (call.attributes.show as Show | undefined) ?? workload.headline;
		if (show !== 'interval')
			return found({ ...cell.value, show, text: printedAverage(summary, workload, show) });
		const interval = printedInterval(summary, workload);
		return interval
			? found({ ...cell.value, show, text: interval })
			: missing('One reading has no interval. Take a second, or show the mean.');
	},
	render({ campaign, profile, workload, summary, show, text }, { call }) {
		return {
			html: element(
				'span',
				{
					class: 'reading',
					'data-campaign': campaign.slug,
					'data-workload': workload.slug,
					'data-profile': profile.slug,
					title: `${workload.name}, ${profile.name}: ${behindReading(summary, workload)}`
				},
				escapeHtml(text)
			),
			plain: text,
			cells: [{ campaign: campaign.slug, profile: profile.slug, workload: workload.slug }],
			bound: {
				directive: 'reading',
				line: call.line,
				campaign: campaign.slug,
				profile: profile.slug,
				workload: workload.slug,
				over: null,
				printed: text,
				value: show === 'median' ? summary.median : summary.mean,
				unit: workload.unit
			}
		};
	}
});
