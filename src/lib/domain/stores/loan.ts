import type { LoanStage } from './words';

export const loanMoves = ['promise', 'send', 'receive', 'send-back', 'return', 'keep', 'lose'] as const;
export type LoanMove = (typeof loanMoves)[number];

/** stage × move → stage, as the trade hands things over. What is not in the table cannot be done. */
export const loanTransitions: Record<LoanStage, Partial<Record<LoanMove, LoanStage>>> = {
	'asked-for': { promise: 'promised', receive: 'here' },
	promised: { send: 'in-transit', receive: 'here' },
	'in-transit': { receive: 'here', lose: 'lost' },
	here: { 'send-back': 'going-back', return: 'returned', keep: 'kept', lose: 'lost' },
	'going-back': { return: 'returned', lose: 'lost' },
	returned: {},
	kept: {},
	lost: {}
};

export const loanMoveWords: Record<LoanMove, string> = {
	promise: 'It is promised',
	send: 'It is on its way',
	receive: 'It is here',
	'send-back': 'Send it back',
	return: 'It is returned',
	keep: 'We keep it',
	lose: 'It is lost'
};

export const loanStageWords: Record<LoanStage, string> = {
	'asked-for': 'asked for',
	promised: 'promised',
	'in-transit': 'in transit',
	here: 'here',
	'going-back': 'going back',
	returned: 'returned',
	kept: 'kept',
	lost: 'lost'
};

/** The stage a move leads to, or null where the move is not open. @example afterMove('here', 'send-back') // 'going-back' */
export const afterMove = (stage: LoanStage, move: LoanMove): LoanStage | null =>
	loanTransitions[stage][move] ?? null;

/** The moves open at a stage, in the table's order. */
export const openMoves = (stage: LoanStage): LoanMove[] =>
	loanMoves.filter((move) => move in loanTransitions[stage]);

/** Stages in which the sample is, or may soon be, in our hands and has to go back. */
export const owedStages: readonly LoanStage[] = ['here', 'going-back'];

/** Stages that end a loan. */
export const closedStages: readonly LoanStage[] = ['returned', 'kept', 'lost'];

/** Stages of a loan that goes on. */
export const openStages: readonly LoanStage[] = ['asked-for', 'promised', 'in-transit', ...owedStages];
