import type { ProfileTradeOff } from '../../bench/trade-off';
import { tradeOffWords } from '../../bench/trade-off-words';
import type { CampaignData, ProfileFacts } from '../data';
import { element, table, type RowGroup } from '../html';
import { cellsOfProfiles, weighedAgainst, weighedRows } from '../weighed';
import { attribute, findBaseline, findCampaign } from './lookup';
import { chosen } from './plate-of-comparison';
import { directive, found, missing } from './shape';

interface TradeOffTable {
	campaign: CampaignData;
	over: ProfileFacts;
	sides: ProfileTradeOff[];
	groups: RowGroup[];
}

/** One group for each thing they are weighed by, with a row for each profile; what nobody has is left out. */
function groupsOf(campaign: CampaignData, sides: ProfileTradeOff[], over: string): RowGroup[] {
	const rows = sides.map((side) => ({ side, rows: weighedRows(campaign, side, over) }));
	const names = rows[0]?.rows.map(({ name }) => name) ?? [];
	return names
		.map((head, at) => ({
			head,
			rows: rows.map(({ side, rows: own }) => {
				const one = own[at];
				return [side.name, one?.printed || 'none', one?.interval ?? '', one?.verdict ?? ''];
			})
		}))
		.filter((group) => group.rows.some(([, printed]) => printed !== 'none'));
}

/** `::tradeoffs`: what each profile gains and costs, by class of work and by cost, as a table. */
export const tradeoffs = directive<TradeOffTable>({
	name: 'tradeoffs',
	level: 'block',
	words: 'A table of what each profile gains and costs, by class of work and by cost.',
	attributes: [
		attribute.campaign(),
		attribute.over(),
		attribute.text('profiles', 'names with commas between them; all if left out')
	],
	resolve(call, data) {
		const campaign = findCampaign(call, data);
		if (!campaign.ok) return campaign;
		const over = findBaseline(call, campaign.value);
		if (!over.ok) return over;
		const profiles = chosen(call, campaign.value);
		if (!profiles.ok) return profiles;
		const sides = weighedAgainst(campaign.value, over.value.slug).filter(
			({ profile }) => profiles.value?.includes(profile) ?? true
		);
		const groups = groupsOf(campaign.value, sides, over.value.slug);
		return groups.length > 0
			? found({ campaign: campaign.value, over: over.value, sides, groups })
			: missing(
					`Nothing in ${campaign.value.name} was measured both with ${over.value.name} and with another.`
				);
	},
	render: ({ campaign, over, sides, groups }, { call }) => ({
		html: element(
			'div',
			{ class: 'results tradeoffs', 'data-line': call.line },
			table(
				`What each gains and costs against ${over.name}. Of work, above nought is better; of costs, it is how much more, in their unit.`,
				[
					{ head: 'Profile' },
					{ head: 'Difference', figures: true },
					{ head: '95 % interval', figures: true },
					{ head: 'Verdict' }
				],
				groups
			)
		),
		plain: `What each gains and costs against ${over.name}`,
		spoken: sides
			.map((side) => {
				const { gains, givesUp, same } = tradeOffWords(side);
				return [`${side.name}, against ${over.name}.`, gains, givesUp, same].filter(Boolean).join(' ');
			})
			.join('\n\n'),
		cells: cellsOfProfiles(campaign, [over.slug, ...sides.map(({ profile }) => profile)]),
		profiles: sides.map(({ profile }) => ({ campaign: campaign.slug, profile }))
	})
});
