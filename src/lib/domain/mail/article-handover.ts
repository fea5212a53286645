import { letter, type Letter } from './letter';

/** What every hand-over mail of an article needs to know. */
export interface HandoverFacts {
	title: string;
	/** Who did it; the application's own acts have none. */
	by: string;
	author: string;
	/** Address of the review page. */
	reviewHref: string;
	/** Address of the editor. */
	editHref: string;
	/** Address readers have. */
	publicHref: string;
	publication: string;
}

const asEditor = 'You get this because you edit here.';
const asAuthor = 'You get this because you wrote the article.';
const asTester = 'You get this because the article prints what you measured.';
const asLiaison = 'You get this because the article used a sample that was lent or given.';
const reasonFor = { editor: asEditor, author: asAuthor, tester: asTester } as const;
/** In what capacity somebody gets a mail. */
export type Capacity = keyof typeof reasonFor;

/** To the editors: an article waits for review. */
export const submitted = (facts: HandoverFacts, { again }: { again: boolean }): Letter =>
	letter({
		subject: `For review: ${facts.title}`,
		paragraphs: [
			again
				? `${facts.by} has worked on the changes you asked for and submitted it again.`
				: `${facts.by} has submitted it for review.`,
			facts.by === facts.author ? '' : `It was written by ${facts.author}.`
		].filter((words) => words !== ''),
		link: { label: 'Review it', href: facts.reviewHref },
		publication: facts.publication,
		because: asEditor
	});

/** To the author: an editor wants changes. */
export const changesAsked = (facts: HandoverFacts, words: string): Letter =>
	letter({
		subject: `Changes asked: ${facts.title}`,
		paragraphs: [`${facts.by} has read it and asks for changes before it can be approved.`],
		quote: { words, by: facts.by },
		link: { label: 'Work on it', href: facts.editHref },
		publication: facts.publication,
		because: asAuthor
	});

/** To the author: an edition is frozen and may be printed. */
export const approved = (facts: HandoverFacts, edition: number): Letter =>
	letter({
		subject: `Approved: ${facts.title}`,
		paragraphs: [
			`${facts.by} has approved it as edition ${edition}. Text, data and page are frozen together: what changes on the bench now does not change the page.`,
			'A change to the text takes the approval off.'
		],
		link: { label: 'See the edition', href: facts.reviewHref },
		publication: facts.publication,
		because: asAuthor
	});

/** To the editors and the author: somebody changed an approved text. */
export const approvalTakenOff = (facts: HandoverFacts, capacity: Capacity): Letter =>
	letter({
		subject: `Back in review: ${facts.title}`,
		paragraphs: [
			`${facts.by} changed the text after it was approved. The approval is off, nothing will be printed, and it waits for review again.`
		],
		link: { label: 'Review it', href: facts.reviewHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the author and the testers: it has a slot. */
export const scheduled = (facts: HandoverFacts, slot: string, capacity: Capacity): Letter =>
	letter({
		subject: `Scheduled: ${facts.title}`,
		paragraphs: [`It goes out on ${slot}. ${facts.by} chose the slot.`],
		link: { label: 'See it', href: facts.reviewHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the author and the testers: it has lost its slot. */
export const unscheduled = (facts: HandoverFacts, capacity: Capacity): Letter =>
	letter({
		subject: `Off the schedule: ${facts.title}`,
		paragraphs: [`${facts.by} has given its slot up. It stays approved and waits for another.`],
		link: { label: 'See it', href: facts.reviewHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the author and the testers: readers have it. */
export const published = (
	facts: HandoverFacts,
	{ edition, again }: { edition: number; again: boolean },
	capacity: Capacity
): Letter =>
	letter({
		subject: again ? `New edition published: ${facts.title}` : `Published: ${facts.title}`,
		paragraphs: [
			again ? `Edition ${edition} has taken the place of the one before.` : 'Readers have it now.'
		],
		link: { label: 'Read it', href: facts.publicHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the liaison, who stands outside the copy: that it is out, and where; not a word of the text. */
export const publishedForLiaison = (facts: HandoverFacts): Letter =>
	letter({
		subject: `Published: ${facts.title}`,
		paragraphs: ['An article that used a lent or given sample is out.'],
		link: { label: 'The published page', href: facts.publicHref },
		publication: facts.publication,
		because: asLiaison
	});

/** To the editors and the author: the slot came and it could not go out. */
export const notPublished = (
	facts: HandoverFacts,
	slot: string,
	reasons: string[],
	capacity: Capacity
): Letter =>
	letter({
		subject: `Not published: ${facts.title}`,
		paragraphs: [
			`Its slot, ${slot}, came and it did not go out:`,
			...reasons.map((reason) => `• ${reason}`),
			'It stays approved, without a slot. Nothing of it was lost.'
		],
		link: { label: 'Choose what to do', href: facts.reviewHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the author and the testers: the page is gone. */
export const withdrawn = (facts: HandoverFacts, reason: string, capacity: Capacity): Letter =>
	letter({
		subject: `Withdrawn: ${facts.title}`,
		paragraphs: [`${facts.by} has withdrawn it. Readers see the reason in its place:`],
		quote: { words: reason, by: facts.by },
		link: { label: 'What readers see', href: facts.publicHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To the liaison: that the page is gone. */
export const withdrawnForLiaison = (facts: HandoverFacts): Letter =>
	letter({
		subject: `Withdrawn: ${facts.title}`,
		paragraphs: ['An article that used a lent or given sample was withdrawn.'],
		link: { label: 'What readers see', href: facts.publicHref },
		publication: facts.publication,
		because: asLiaison
	});

/** To the author and the testers: a correction is listed. */
export const corrected = (facts: HandoverFacts, body: string, capacity: Capacity): Letter =>
	letter({
		subject: `Corrected: ${facts.title}`,
		paragraphs: [`${facts.by} has listed a correction. Readers are told:`],
		quote: { words: body, by: facts.by },
		link: { label: 'See the page', href: facts.publicHref },
		publication: facts.publication,
		because: reasonFor[capacity]
	});

/** To whoever takes articles over: which they are. */
export const handedOver = (facts: {
	by: string;
	titles: string[];
	/** Address of the list of what is theirs. */
	href: string;
	publication: string;
}): Letter =>
	letter({
		subject:
			facts.titles.length === 1
				? `Yours now: ${facts.titles[0] ?? ''}`
				: `Yours now: ${facts.titles.length} articles`,
		paragraphs: [
			`${facts.by} has handed you ${facts.titles.length === 1 ? 'this article' : 'these articles'}. You are the author from now on.`,
			...facts.titles.map((title) => `• ${title}`)
		],
		link: { label: 'See what is yours', href: facts.href },
		publication: facts.publication,
		because: 'You get this because you write here.'
	});
