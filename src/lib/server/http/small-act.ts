import { fail } from '@sveltejs/kit';
import type { Outcome } from '../../domain/shared/outcome';
import { statusOf } from './problem';

/** What a page says after a button in a row of it: that it is done, or why not. */
export const saidOrProblem = (outcome: Outcome<unknown>, said: string) =>
	outcome.ok ? { said } : fail(statusOf(outcome.reason), { problem: outcome.message });
