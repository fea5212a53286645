import type { CampaignData, KitLine } from '../data';
import { printedDates } from '../dates';
import { element, escapeHtml } from '../html';
import { attribute, campaignsOf } from './lookup';
import { countsInWords } from '../plates/foot';
import { directive, found, missing } from './shape';

const provenance: Record<KitLine['provenance'], string> = {
	bought: 'bought',
	loaned: 'on loan',
	given: 'given to us',
	'pre-production': 'before it was on sale'
};

type Line = [head: string, text: string];

/** The samples of a rig, those of one part and one provenance counted together. */
function samplesOf(kit: readonly KitLine[]): string {
	const counts = new Map<string, number>();
	for (const { partName, provenance: from } of kit) {
		const words = `${partName} (${provenance[from]})`;
		counts.set(words, (counts.get(words) ?? 0) + 1);
	}
	return [...counts].map(([words, n]) => (n === 1 ? words : `${n} × ${words}`)).join(', ');
}

function protocolOf({ workloads }: CampaignData): string {
	const warmUps = Math.max(0, ...workloads.map((one) => one.warmUps));
	const rests = Math.max(0, ...workloads.map((one) => one.coolDownS));
	return [
		warmUps > 0 ? `up to ${warmUps} warm-up${warmUps === 1 ? '' : 's'} before` : '',
		rests > 0 ? `a rest of up to ${rests} s between` : ''
	]
		.filter((part) => part !== '')
		.join(', ');
}

function linesOf(campaign: CampaignData, zone: string): Line[] {
	const { rig, kit, cells } = campaign;
	const measured = cells.flatMap(({ summary, ...cell }) => (summary ? [{ ...cell, n: summary.n }] : []));
	const days = measured.flatMap(({ from, to }) => [from, to].filter((at): at is string => at !== null));
	const testers = [...new Set(measured.flatMap((cell) => cell.testers))];
	const protocol = protocolOf(campaign);
	const repeats = countsInWords(measured.map(({ n }) => n));
	const software = [rig.firmware && `firmware ${rig.firmware}`, rig.driver && `driver ${rig.driver}`, rig.os];
	const lines: Line[] = [
		['Rig', `${rig.name}, revision ${rig.revision}`],
		['Samples', samplesOf(kit)],
		['Software', software.filter(Boolean).join(', ')],
		[
			'Measured',
			`${campaign.workloads.length} workload${campaign.workloads.length === 1 ? '' : 's'} with ${campaign.profiles.length} profile${campaign.profiles.length === 1 ? '' : 's'}`
		],
		['Repeats', measured.length > 0 ? [repeats, protocol].filter((part) => part !== '').join('; ') : ''],
		['Days', printedDates(days, zone)],
		[testers.length === 1 ? 'Tester' : 'Testers', testers.join(', ')]
	];
	return lines.filter(([, text]) => text !== '');
}

/** `::tested`: the rig, where its samples came from, how often, when and by whom it was measured. */
export const tested = directive<CampaignData[]>({
	name: 'tested',
	level: 'block',
	words: 'What we tested, and how: rig, samples and where they came from, software, repeats, days, testers.',
	attributes: [attribute.campaign()],
	resolve(call, data) {
		const campaigns = campaignsOf(call, data);
		if (!campaigns.ok) return campaigns;
		const measured = campaigns.value.filter(({ cells }) => cells.some(({ summary }) => summary !== null));
		return measured.length > 0
			? found(measured)
			: missing('Nothing was measured yet, so there is nothing to say of how.');
	},
	render(campaigns, { call, data }) {
		const parts = campaigns.map((campaign) => ({ name: campaign.name, lines: linesOf(campaign, data.zone) }));
		const list = (lines: Line[]) =>
			`<dl>${lines.map(([head, text]) => `<div>${element('dt', {}, escapeHtml(head))}${element('dd', {}, escapeHtml(text))}</div>`).join('')}</dl>`;
		const named = (name: string) =>
			parts.length > 1 ? element('p', { class: 'tested-campaign' }, escapeHtml(name)) : '';
		return {
			html: element(
				'section',
				{ class: 'tested', 'aria-label': 'What we tested, and how', 'data-line': call.line },
				`<h3>What we tested, and how</h3>${parts.map(({ name, lines }) => named(name) + list(lines)).join('')}`
			),
			plain: parts
				.map(({ lines }) => lines.map(([head, text]) => `${head}: ${text}.`).join(' '))
				.join('\n\n'),
			spoken: parts
				.map(({ lines }) =>
					lines
						.filter(([head]) => head === 'Rig' || head === 'Repeats' || head === 'Days')
						.map(([head, text]) => `${head}: ${text}.`)
						.join(' ')
				)
				.join('\n\n'),
			campaigns: campaigns.map(({ slug }) => slug)
		};
	}
});
