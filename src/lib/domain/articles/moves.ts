import { may, type Act } from '../people/policy';
import type { Actor } from '../people/roles';
import { moves, open, type Move, type Standing } from './stage';

/** Which act of the policy each move is. */
export const actOf: Record<Move, Act> = {
	edit: 'article.edit',
	submit: 'article.submit',
	'ask-changes': 'article.ask-changes',
	approve: 'article.approve',
	schedule: 'article.schedule',
	unschedule: 'article.schedule',
	publish: 'article.publish',
	revise: 'article.correct',
	keep: 'article.correct',
	withdraw: 'article.withdraw'
};

/** Moves that nobody makes with an article they wrote, even after they handed it on. */
export const judging: readonly Move[] = ['ask-changes', 'approve'];

/** The moves that an actor can make with an article as it stands. */
export const movesFor = (actor: Actor, standing: Standing, authorId: string, handedItOn = false): Move[] =>
	moves.filter(
		(move) =>
			open(standing, move) && may(actor, actOf[move], { authorId }) && !(handedItOn && judging.includes(move))
	);
