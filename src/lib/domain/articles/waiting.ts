import { DateTime } from 'luxon';
import { slotShort } from './slot';

/** One thing that waits for a person, in words. */
export interface Waiting {
	/** What orders the list: when it is due, or since when it waits. */
	at: Date;
	/** Whether `at` is a date by which it should have been done and has passed. */
	late: boolean;
	title: string;
	href: string;
	detail: string;
	/** The act that answers it, as its button says. */
	action: { label: string; href: string };
}

interface Card {
	slug: string;
	title: string;
	stage: string;
	slotAt: Date | null;
	updatedAt: Date;
	authorName: string;
}

const due = (card: { slotAt: Date | null; updatedAt: Date }, now: Date) => ({
	at: card.slotAt ?? card.updatedAt,
	late: card.slotAt !== null && card.slotAt < now
});
const many = (n: number, one: string) => `${n} ${one}${n === 1 ? '' : 's'}`;
const reviewOf = (slug: string) => `/desk/articles/${slug}/review`;

/** An article in review, for an editor who did not write it. */
export const toReview = (card: Card, blocks: number, now: Date): Waiting => ({
	...due(card, now),
	title: card.title,
	href: reviewOf(card.slug),
	detail: `${card.authorName} submitted it for review${blocks > 0 ? `; ${many(blocks, 'blocking comment')} ${blocks === 1 ? 'stands' : 'stand'}` : ''}.`,
	action: { label: 'Review', href: reviewOf(card.slug) }
});

/** An approved article without a slot, for an editor. */
export const toSchedule = (
	card: Card,
	embargo: { until: Date; partName: string } | undefined,
	now: Date,
	zone: string
): Waiting => ({
	at: embargo?.until ?? card.slotAt ?? card.updatedAt,
	late: card.slotAt !== null && card.slotAt < now,
	title: card.title,
	href: reviewOf(card.slug),
	detail: embargo
		? `Approved, without a slot. The embargo on ${embargo.partName} lifts ${slotShort(embargo.until, zone)}.`
		: card.slotAt
			? `Approved. Its planned slot, ${slotShort(card.slotAt, zone)}, is not confirmed.`
			: 'Approved, without a slot.',
	action: { label: 'Choose a slot', href: `${reviewOf(card.slug)}#slot` }
});

/** An article of one's own that came back, or has comments to answer. */
export const toChange = (card: Card, comments: number, now: Date): Waiting => ({
	...due(card, now),
	title: card.title,
	href: `/desk/articles/${card.slug}`,
	detail:
		card.stage === 'changes-asked'
			? `Changes asked${comments > 0 ? `; ${many(comments, 'comment')} to answer` : ''}.`
			: `${many(comments, 'comment')} to answer.`,
	action:
		card.stage === 'changes-asked'
			? { label: 'Make changes', href: `/desk/articles/${card.slug}` }
			: { label: 'Answer', href: reviewOf(card.slug) }
});

/** A campaign whose complete cells nobody has signed, for a tester. */
export const toSign = (
	campaign: { slug: string; name: string; dueAt: Date | null; cells: number; latest: Date },
	now: Date
): Waiting => ({
	at: campaign.dueAt ?? campaign.latest,
	late: campaign.dueAt !== null && campaign.dueAt < now,
	title: campaign.name,
	href: `/bench/campaigns/${campaign.slug}`,
	detail: `${many(campaign.cells, 'cell')} ${campaign.cells === 1 ? 'has' : 'have'} all readings and no signature.`,
	action: { label: 'Sign off', href: `/bench/campaigns/${campaign.slug}` }
});

/** Everything that waits, in date order. */
export const inDateOrder = (waiting: Waiting[]): Waiting[] =>
	[...waiting].sort((a, b) => a.at.getTime() - b.at.getTime());

/**
 * A moment as somebody at a desk says it, in the publication's zone: the hour today, yesterday, the day of a week
 * near by, else the date.
 * @example dayWords(new Date('2026-11-13T13:00Z'), new Date('2026-11-11T07:40Z'), 'Europe/Oslo') // 'Friday 14:00'
 */
export function dayWords(at: Date, now: Date, zone: string): string {
	const local = DateTime.fromJSDate(at, { zone }).setLocale('en-GB');
	const today = DateTime.fromJSDate(now, { zone }).startOf('day');
	const days = Math.round(local.startOf('day').diff(today, 'days').days);
	const time = local.toFormat('HH:mm');
	if (days === 0) return `today ${time}`;
	if (days === -1) return 'yesterday';
	if (days === 1) return `tomorrow ${time}`;
	if (days > 1 && days < 7) return `${local.toFormat('cccc')} ${time}`;
	return local.toFormat(local.year === today.year ? 'd LLL' : 'd LLL yyyy');
}

/** The greeting of an hour of the day. @example greeting(now, zone) // 'Good morning' */
export function greeting(now: Date, zone: string): string {
	const { hour } = DateTime.fromJSDate(now, { zone });
	if (hour < 5) return 'Still up';
	if (hour < 12) return 'Good morning';
	return hour < 18 ? 'Good afternoon' : 'Good evening';
}
