import type { CampaignData } from '../data';

/**
 * The series number of each profile of a campaign, the same in every plate of an article: the baseline 0
 * (graphite), the subject 1 (blue), the others from 2 in the campaign's order.
 */
export function seriesOf(campaign: CampaignData, subject?: string): Map<string, number> {
	const others = campaign.profiles.map((one) => one.slug).filter((slug) => slug !== campaign.baseline);
	const first = others.find((slug) => slug === subject);
	const ordered = first === undefined ? others : [first, ...others.filter((slug) => slug !== first)];
	return new Map([
		[campaign.baseline, 0],
		...ordered.map((slug, index): [string, number] => [slug, index + 1])
	]);
}
