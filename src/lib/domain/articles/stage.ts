export const stages = [
	'drafting',
	'in-review',
	'changes-asked',
	'approved',
	'scheduled',
	'published',
	'withdrawn'
] as const;
export type Stage = (typeof stages)[number];

export const moves = [
	'submit',
	'ask-changes',
	'approve',
	'schedule',
	'unschedule',
	'publish',
	'edit',
	'revise',
	'keep',
	'withdraw'
] as const;
export type Move = (typeof moves)[number];

/**
 * stage × move → stage. What is not in the table cannot be done.
 * `edit` is a saved change to the text; on an approved or scheduled article it takes the approval off.
 * `revise` opens a new edition of a published article: the page stays as it is until the next approval is printed.
 * `keep` gives such a new edition up and leaves the page as printed; `withdraw` takes the page itself away.
 * Both need a page that readers have, which `open` below asks for.
 */
export const transitions: Record<Stage, Partial<Record<Move, Stage>>> = {
	drafting: { edit: 'drafting', submit: 'in-review', keep: 'published', withdraw: 'withdrawn' },
	'in-review': {
		edit: 'in-review',
		'ask-changes': 'changes-asked',
		approve: 'approved',
		keep: 'published',
		withdraw: 'withdrawn'
	},
	'changes-asked': { edit: 'changes-asked', submit: 'in-review', keep: 'published', withdraw: 'withdrawn' },
	approved: {
		edit: 'in-review',
		'ask-changes': 'changes-asked',
		schedule: 'scheduled',
		publish: 'published',
		keep: 'published',
		withdraw: 'withdrawn'
	},
	scheduled: {
		edit: 'in-review',
		schedule: 'scheduled',
		unschedule: 'approved',
		publish: 'published',
		withdraw: 'withdrawn'
	},
	published: { revise: 'drafting', withdraw: 'withdrawn' },
	withdrawn: { revise: 'drafting' }
};

/** The stage a move leads to, or null where the move is not open. @example after('approved', 'edit') // 'in-review' */
export const after = (stage: Stage, move: Move): Stage | null => transitions[stage][move] ?? null;

/** An article as far as its stage is concerned: where it stands, and whether readers have a page of it. */
export interface Standing {
	stage: Stage;
	/** A live edition that has not been withdrawn. */
	hasPage: boolean;
}

const needsPage: ReadonlySet<Move> = new Set(['keep', 'withdraw']);

/** Whether a move is open to an article. @example open({ stage: 'drafting', hasPage: false }, 'withdraw') // false */
export const open = ({ stage, hasPage }: Standing, move: Move): boolean =>
	after(stage, move) !== null && (hasPage || !needsPage.has(move));

export const stageWords: Record<Stage, string> = {
	drafting: 'drafting',
	'in-review': 'in review',
	'changes-asked': 'changes asked',
	approved: 'approved',
	scheduled: 'scheduled',
	published: 'published',
	withdrawn: 'withdrawn'
};

/** Why a move is not open, in words for the person who tried. */
export function closedWords(stage: Stage, move: Move): string {
	if (move === 'edit')
		return stage === 'withdrawn'
			? 'This article is withdrawn. Start a new edition to work on it again.'
			: 'This article is published. Start a new edition to change it.';
	const tried: Record<Exclude<Move, 'edit'>, string> = {
		submit: 'Only an article in drafting, or with changes asked, can be submitted',
		'ask-changes': 'Changes can be asked of an article in review or approved',
		approve: 'Only an article in review can be approved',
		schedule: 'Only an approved article can be scheduled',
		unschedule: 'Only a scheduled article has a slot to give up',
		publish: 'Only an approved article can be published',
		revise: 'A new edition can be started of a published or withdrawn article',
		keep: 'There is no new edition to give up',
		withdraw: 'Readers have no page of this article to withdraw'
	};
	return `${tried[move]}. This one is ${stageWords[stage]}. Nothing was changed.`;
}
