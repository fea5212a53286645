import { describe, expect, it } from 'vitest';
import { afterMove, closedStages, loanMoves, openMoves } from './loan';
import { loanStages } from './words';

describe('the way of a loan', () => {
	it('goes from asking to returning in the order of the trade', () => {
		const way = (['promise', 'send', 'receive', 'send-back', 'return'] as const).reduce(
			(stage, move) => {
				const next = afterMove(stage, move);
				if (!next) throw new Error(`${move} is not open at ${stage}`);
				return next;
			},
			loanStages[0] as (typeof loanStages)[number]
		);
		expect(way).toBe('returned');
	});

	it('offers nothing once it is closed', () => {
		for (const stage of closedStages) expect(openMoves(stage)).toEqual([]);
	});

	it('cannot be returned before it was here', () => {
		for (const stage of ['asked-for', 'promised', 'in-transit'] as const)
			expect(afterMove(stage, 'return')).toBeNull();
		expect(loanMoves).toHaveLength(7);
	});
});
