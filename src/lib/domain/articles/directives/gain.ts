import { comparisonOver } from '../against';
import { behindGain, gainInWords, printedSize } from '../figures-in-words';
import { element, escapeHtml } from '../html';
import { printedGain, printedGainRange, printedRatio } from '../../shared/quantity';
import type { Comparison, Difference } from '../../bench/figures';
import type { CampaignData, ProfileFacts } from '../data';
import { attribute, findBaseline, findCell, type Cell } from './lookup';
import { directive, found, missing } from './shape';

const shows = ['signed', 'size', 'words', 'ratio', 'interval'] as const;
type Show = (typeof shows)[number];

interface Gain extends Cell {
	baseline: ProfileFacts;
	comparison: Comparison;
	show: Show;
	text: string;
}

/** The first difference of a column that is not held by ratio; undefined where it is. */
const heldInDifference = (campaign: CampaignData, workload: string): Difference | undefined =>
	campaign.cells.find((one) => one.workload === workload && one.difference)?.difference ?? undefined;

function printedAs(show: Show, comparison: Comparison): string | null {
	switch (show) {
		case 'signed':
			return printedGain(comparison.gainPercent, comparison.gainCi95);
		case 'size':
			return printedSize(comparison);
		case 'words':
			return gainInWords(comparison);
		case 'ratio':
			return printedRatio(comparison.ratio);
		case 'interval':
			return comparison.gainCi95 && printedGainRange(comparison.gainCi95);
	}
}

/** `:gain{workload= profile= over=}`: how much better a profile is than another, in percent of its ratio. */
export const gain = directive<Gain>({
	name: 'gain',
	level: 'inline',
	words: 'A gain or loss over another profile, in percent.',
	attributes: [
		attribute.workload(),
		attribute.profile(),
		attribute.over(),
		attribute.campaign(),
		attribute.oneOf('show', 'with its sign (as it is if left out), its size alone, in words …', shows)
	],
	lasting: true,
	resolve(call, data) {
		const cell = findCell(call, data);
		if (!cell.ok) return cell;
		const { campaign, workload, profile } = cell.value;
		const baseline = findBaseline(call, campaign);
		if (!baseline.ok) return baseline;
		if (baseline.value.slug === profile.slug) {
			return missing(
				`${profile.name} cannot be held against itself. Choose another profile.`,
				campaign.profiles.map((one) => one.slug).filter((slug) => slug !== profile.slug)
			);
		}
		const comparison = comparisonOver(campaign, workload, profile.slug, baseline.value.slug);
		if (!comparison) {
			const difference = heldInDifference(cell.value.campaign, workload.slug);
			if (difference) {
				return missing(
					`${workload.name} is in ${workload.unit}, where a ratio says nothing: print both readings, or the difference in your own words. ${difference.why}`
				);
			}
			return missing(
				`${workload.name} has no readings with ${baseline.value.name} to hold ${profile.name} against.`
			);
		}
		const show = (call.attributes.show as Show | undefined) ?? 'signed';
		const text = printedAs(show, comparison);
		return text === null
			? missing('This gain has no interval: it needs two readings or more on each side.')
			: found({ ...cell.value, baseline: baseline.value, comparison, show, text });
	},
	render({ campaign, profile, workload, baseline, comparison, show, text }, { call }) {
		const cell = { campaign: campaign.slug, workload: workload.slug };
		return {
			html: element(
				'span',
				{
					// Words may break between lines, a number may not.
					class: show === 'words' ? 'gain gain-words' : 'gain',
					'data-campaign': campaign.slug,
					'data-workload': workload.slug,
					'data-profile': profile.slug,
					'data-over': baseline.slug,
					'data-verdict': comparison.verdict,
					title: `${workload.name}, ${profile.name} ${behindGain(comparison, workload, baseline.name)}`
				},
				escapeHtml(text)
			),
			plain: text,
			cells: [
				{ ...cell, profile: profile.slug },
				{ ...cell, profile: baseline.slug }
			],
			bound: {
				directive: 'gain',
				line: call.line,
				...cell,
				profile: profile.slug,
				over: baseline.slug,
				printed: text,
				value: show === 'ratio' ? comparison.ratio : comparison.gainPercent,
				unit: show === 'ratio' ? '' : '%'
			}
		};
	}
});
