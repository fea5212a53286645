import type { ProfileTradeOff } from '../../bench/trade-off';
import type { CampaignData, ProfileFacts } from '../data';
import { element, escapeHtml } from '../html';
import { cellsOfProfiles, weighedAgainst, weighedRows, type WeighedRow } from '../weighed';
import { attribute, findBaseline, findProfile } from './lookup';
import { emptyInside } from './containers';
import { directive, found, missing, type Inside } from './shape';

interface Weighed {
	campaign: CampaignData;
	profile: ProfileFacts;
	over: ProfileFacts;
	rows: WeighedRow[];
	inside: Inside;
}

const row = ({ name, printed, interval, verdict }: WeighedRow): string => {
	const range = interval ? element('span', { class: 'verdict-range' }, escapeHtml(interval)) : '';
	return `<tr>${element('th', { scope: 'row' }, escapeHtml(name))}${element('td', { class: 'num' }, escapeHtml(printed) + range)}${element('td', {}, escapeHtml(verdict))}</tr>`;
};

const whom = (className: string, head: string, text: string | undefined): string =>
	text ? element('p', { class: className }, `<strong>${head}</strong> ${escapeHtml(text)}`) : '';

/** The rows that have something to say. */
const measured = (campaign: CampaignData, side: ProfileTradeOff, over: string): WeighedRow[] =>
	weighedRows(campaign, side, over).filter(({ printed }) => printed !== '');

/** `:::verdict{profile= over=}`: what the data say of a profile, then what the writer makes of it. */
export const verdict = directive<Weighed>({
	name: 'verdict',
	level: 'container',
	words: 'A box with what the measurements say of a profile, what you make of it, and for whom it is.',
	attributes: [
		attribute.profile(),
		attribute.over(),
		attribute.campaign(),
		attribute.text('for', 'whom it is good for'),
		attribute.text('not', 'whom it is not for'),
		attribute.text('title', 'a heading of your own')
	],
	holds: ['caution'],
	sample: 'What you make of it, in two or three sentences.',
	resolve(call, data, { inside }) {
		const place = findProfile(call, data);
		if (!place.ok) return place;
		const { campaign, profile } = place.value;
		const over = findBaseline(call, campaign);
		if (!over.ok) return over;
		const side = weighedAgainst(campaign, over.value.slug).find((one) => one.profile === profile.slug);
		const rows = side ? measured(campaign, side, over.value.slug) : [];
		if (rows.length === 0) {
			return missing(
				`There is no verdict on ${profile.name} over ${over.value.name}: no workload was measured with both.`,
				campaign.profiles.map(({ slug }) => slug).filter((slug) => slug !== over.value.slug)
			);
		}
		return inside && inside.plain !== ''
			? found({ campaign, profile, over: over.value, rows, inside })
			: emptyInside('verdict');
	},
	render({ campaign, profile, over, rows, inside }, { call }) {
		const { for: good, not, title } = call.attributes;
		const head = title ?? `The verdict: ${profile.name}`;
		const said = [
			...rows.map(({ name, printed, verdict: words }) => `${name}: ${printed}, ${words}.`),
			...(good ? [`Good for: ${good}`] : []),
			...(not ? [`Not for: ${not}`] : [])
		];
		return {
			html: element(
				'section',
				{
					class: 'verdict',
					'aria-label': head,
					'data-line': call.line,
					'data-profile': profile.slug,
					'data-over': over.slug
				},
				element('h3', {}, escapeHtml(head)) +
					`<table>${element('caption', {}, escapeHtml(`Against ${over.name}; gains with their 95 % intervals`))}<thead class="visually-hidden"><tr><th scope="col">Work</th><th scope="col" class="num">Gain</th><th scope="col">Verdict</th></tr></thead><tbody>${rows.map(row).join('')}</tbody></table>` +
					element('div', { class: 'verdict-words' }, inside.html) +
					whom('verdict-for', 'Good for', good) +
					whom('verdict-not', 'Not for', not)
			),
			plain: [head, ...said.slice(0, rows.length), inside.plain, ...said.slice(rows.length)].join('\n\n'),
			spoken: [
				`${head}, against ${over.name}.`,
				...said.slice(0, rows.length),
				inside.spoken,
				...said.slice(rows.length)
			].join('\n\n'),
			cells: cellsOfProfiles(campaign, [profile.slug, over.slug]),
			profiles: [{ campaign: campaign.slug, profile: profile.slug }]
		};
	}
});
