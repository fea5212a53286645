import { overallOver } from '../against';
import { printedSize } from '../figures-in-words';
import { element, escapeHtml } from '../html';
import { printedGain, printedGainRange, printedRatio } from '../../shared/quantity';
import type { Overall } from '../../bench/figures';
import { overallWords } from '../../bench/overall-words';
import type { ProfileFacts } from '../data';
import { attribute, findBaseline, findProfile, type ProfilePlace } from './lookup';
import { directive, found, missing } from './shape';

const shows = ['signed', 'size', 'words', 'ratio', 'interval'] as const;
type Show = (typeof shows)[number];

interface OverallGain extends ProfilePlace {
	baseline: ProfileFacts;
	figure: Overall;
	show: Show;
	text: string;
}

function printedAs(show: Show, { gainPercent, gainCi95 = null, ratio }: Overall): string | null {
	if (show === 'interval') return gainCi95 && printedGainRange(gainCi95);
	const size = printedSize({ gainPercent, gainCi95: null });
	if (show === 'ratio') return printedRatio(ratio);
	if (show === 'size') return size;
	if (show === 'words') return gainPercent < 0 ? `${size} worse` : `${size} better`;
	return printedGain(gainPercent);
}

/** `:overall{profile= over=}`: the geometric mean of a profile's ratios over another. */
export const overallGain = directive<OverallGain>({
	name: 'overall',
	level: 'inline',
	words: 'The overall gain of a profile: the geometric mean over the workloads that measure performance.',
	attributes: [
		attribute.profile(),
		attribute.over(),
		attribute.campaign(),
		attribute.oneOf('show', 'with its sign (as it is if left out), its size alone, in words …', shows)
	],
	lasting: true,
	resolve(call, data) {
		const place = findProfile(call, data);
		if (!place.ok) return place;
		const { campaign, profile } = place.value;
		const baseline = findBaseline(call, campaign);
		if (!baseline.ok) return baseline;
		const figure = overallOver(campaign, profile.slug, baseline.value.slug);
		if (profile.slug === baseline.value.slug || !figure) {
			const [why] = overallWords([], campaign.workloads);
			return missing(
				why ??
					`There is no overall figure of ${profile.name} over ${baseline.value.name}: no workload of performance was measured with both.`,
				campaign.profiles.map((one) => one.slug).filter((slug) => slug !== baseline.value.slug)
			);
		}
		const show = (call.attributes.show as Show | undefined) ?? 'signed';
		const text = printedAs(show, figure);
		return text === null
			? missing(`The overall figure of ${profile.name} has no interval: a side has a single reading.`)
			: found({ ...place.value, baseline: baseline.value, figure, show, text });
	},
	render({ campaign, profile, baseline, figure, show, text }, { call }) {
		const count = figure.workloads.length;
		const interval = figure.gainCi95 ? `, 95 % interval ${printedGainRange(figure.gainCi95)}` : '';
		const restsOn = overallWords([{ name: profile.name, figure }], campaign.workloads).join(' ');
		return {
			html: element(
				'span',
				{
					class: 'overall',
					'data-campaign': campaign.slug,
					'data-profile': profile.slug,
					'data-over': baseline.slug,
					title: `${profile.name} over ${baseline.name}: geometric mean of the ratios of ${count} workload${count === 1 ? '' : 's'}${interval}. ${restsOn}`
				},
				escapeHtml(text)
			),
			plain: text,
			cells: figure.workloads.flatMap((workload) => [
				{ campaign: campaign.slug, profile: profile.slug, workload },
				{ campaign: campaign.slug, profile: baseline.slug, workload }
			]),
			bound: {
				directive: 'overall',
				line: call.line,
				campaign: campaign.slug,
				profile: profile.slug,
				workload: null,
				over: baseline.slug,
				printed: text,
				value: show === 'ratio' ? figure.ratio : figure.gainPercent,
				unit: show === 'ratio' ? '' : '%'
			}
		};
	}
});
