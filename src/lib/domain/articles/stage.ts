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
	'withdraw'
] as const;
export type Move = (typeof moves)[number];

/**
 * stage × move → stage. What is not in the table cannot be done.
 * `edit` is a saved change to the text; on an approved or scheduled article it takes the approval off.
 * `revise` opens a new edition of a published article: the page stays as it is until the next approval.
 */
export const transitions: Record<Stage, Partial<Record<Move, Stage>>> = {
	drafting: { edit: 'drafting', submit: 'in-review' },
	'in-review': { edit: 'in-review', 'ask-changes': 'changes-asked', approve: 'approved' },
	'changes-asked': { edit: 'changes-asked', submit: 'in-review' },
	approved: {
		edit: 'in-review',
		'ask-changes': 'changes-asked',
		schedule: 'scheduled',
		publish: 'published'
	},
	scheduled: { edit: 'in-review', schedule: 'scheduled', unschedule: 'approved', publish: 'published' },
	published: { revise: 'drafting', withdraw: 'withdrawn' },
	withdrawn: { revise: 'drafting' }
};

/** The stage a move leads to, or null where the move is not open. @example after('approved', 'edit') // 'in-review' */
export const after = (stage: Stage, move: Move): Stage | null => transitions[stage][move] ?? null;
