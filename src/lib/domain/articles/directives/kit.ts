import { formatMoney } from '../../shared/money';
import { printedDay } from '../dates';
import { element, escapeHtml } from '../html';
import { unknownName } from '../names-near';
import type { CampaignData, KitLine } from '../data';
import { campaignsOf } from './lookup';
import { directive, found, missing } from './shape';

const provenanceWords: Record<KitLine['provenance'], string> = {
	bought: 'bought',
	loaned: 'on loan',
	given: 'given to us',
	'pre-production': 'pre-production'
};

/** What the lines with a price come to, currency by currency, in the order they first appear. */
export function totals(kit: readonly KitLine[]): { currency: string; amountMinor: number }[] {
	const sums = new Map<string, number>();
	for (const { price } of kit) {
		if (price) sums.set(price.currency, (sums.get(price.currency) ?? 0) + price.amountMinor);
	}
	return [...sums].map(([currency, amountMinor]) => ({ currency, amountMinor }));
}

function pricesSeen(kit: readonly KitLine[]): string {
	const days = kit.flatMap((line) => (line.price ? [line.price.observedOn] : [])).sort();
	const first = days[0];
	const last = days.at(-1);
	const unpriced = kit.filter((line) => !line.price).length;
	const seen =
		first === undefined || last === undefined
			? 'No prices recorded.'
			: first === last
				? `Prices as seen on ${printedDay(first)}.`
				: `Prices as seen from ${printedDay(first)} to ${printedDay(last)}.`;
	const without =
		unpriced > 0 && first !== undefined
			? ` ${unpriced === 1 ? 'One line has' : `${unpriced} lines have`} no price and ${unpriced === 1 ? 'is' : 'are'} not in the sum.`
			: '';
	return seen + without;
}

const row = (cells: [tag: 'th' | 'td', className: string | undefined, text: string][]): string =>
	`<tr>${cells.map(([tag, className, text]) => element(tag, { class: className, scope: tag === 'th' ? 'row' : undefined }, escapeHtml(text))).join('')}</tr>`;

/** `::kit{rig=}`: what was tested, where it came from, and what it costs. */
export const kit = directive<CampaignData>({
	name: 'kit',
	level: 'block',
	words: 'What we tested: the parts of a rig, where they came from and what they cost.',
	attributes: [
		{
			name: 'rig',
			required: false,
			words: 'which rig, where the article has several',
			values: (data) => [...new Set(data.campaigns.map((campaign) => campaign.rig.slug))]
		}
	],
	resolve(call, data) {
		const campaigns = campaignsOf(call, data);
		if (!campaigns.ok) return campaigns;
		const rigs = [...new Set(campaigns.value.map((campaign) => campaign.rig.slug))];
		const name = call.attributes.rig;
		if (name === undefined && rigs.length > 1)
			return missing('This article has several rigs. Add rig= to say which.', rigs);
		// The newest revision of a rig that several campaigns used is the one to print.
		const [newest] = campaigns.value
			.filter((campaign) => campaign.rig.slug === (name ?? rigs[0]))
			.sort((a, b) => b.rig.revision - a.rig.revision);
		if (!newest)
			return unknownName(`No campaign of this article used a rig called “${name ?? ''}”.`, name ?? '', rigs);
		return newest.kit.length > 0
			? found(newest)
			: missing(`Rig ${newest.rig.name} has no samples recorded, so there is nothing to list.`);
	},
	render(campaign, { call }) {
		const { rig, kit: lines } = campaign;
		const body = lines.map((line) =>
			row([
				['th', undefined, line.partName],
				['td', line.provenance === 'bought' ? undefined : 'kit-lent', provenanceWords[line.provenance]],
				['td', 'num', line.price ? formatMoney(line.price.amountMinor, line.price.currency) : 'no price']
			])
		);
		const sums = totals(lines).map((sum) =>
			row([
				['th', undefined, 'As tested'],
				['td', undefined, ''],
				['td', 'num', formatMoney(sum.amountMinor, sum.currency)]
			])
		);
		const software = [
			rig.firmware && `firmware ${rig.firmware}`,
			rig.driver && `driver ${rig.driver}`,
			rig.os
		].filter(Boolean);
		const note = [
			`Rig ${rig.name}, revision ${rig.revision}${software.length > 0 ? `: ${software.join(', ')}` : ''}.`,
			pricesSeen(lines)
		];
		return {
			html: element(
				'section',
				{ class: 'kit', 'data-line': call.line, 'data-rig': rig.slug },
				`<h3>What we tested</h3><table><thead class="visually-hidden"><tr><th scope="col">Part</th><th scope="col">Where it came from</th><th scope="col" class="num">Price</th></tr></thead><tbody>${body.join('')}</tbody>${sums.length > 0 ? `<tfoot>${sums.join('')}</tfoot>` : ''}</table>${element('p', { class: 'kit-note' }, escapeHtml(note.join(' ')))}`
			),
			plain: `What we tested: ${lines.map((line) => line.partName).join(', ')}.`,
			campaigns: [campaign.slug]
		};
	}
});
