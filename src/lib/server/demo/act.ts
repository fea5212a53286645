import type { Outcome } from '../../domain/shared/outcome';
import type { Context } from '../context';
import type { GridAnswer } from '../services/bench/record-grid-readings';
import type { Calendar } from './calendar';
import type { Staff, Who } from './staff';

/** One thing that somebody of the demo did, at its time. */
export interface Act {
	at: Date;
	who: Who;
	/** For the error, should the application refuse it. */
	what: string;
	run: (ctx: Context) => Promise<Outcome<unknown>>;
}

/** What acts leave behind for later ones. */
export interface World {
	calendar: Calendar;
	/** What the grid answered for a cell, by campaign/profile/workload. */
	runs: Map<string, GridAnswer>;
	/** Numbers of loans, by the demo's own name for them. */
	loans: Map<string, number>;
	/** Numbers of comments, by the demo's own name for them. */
	comments: Map<string, number>;
	/** Numbers of attempts, by the slug of their ladder. */
	attempts: Map<string, number>;
}

/** A number an earlier act left behind. */
export function kept<T>(from: Map<string, T>, key: string): T {
	const value = from.get(key);
	if (value === undefined) throw new Error(`Nothing was kept under ${key}: the acts are out of order.`);
	return value;
}

/**
 * Does all acts in the order of their times, each as its person and at its moment, so that the audit log, the
 * outbox and the revisions read as if it had been so. An act that is refused ends the fill: the demo shows only
 * what the application allows.
 */
export async function perform(
	acts: Act[],
	staff: Staff,
	base: Omit<Context, 'actor' | 'now'>
): Promise<void> {
	const ordered = [...acts].sort((a, b) => a.at.getTime() - b.at.getTime());
	for (const { at, who, what, run } of ordered) {
		const outcome = await run({ ...base, actor: staff[who], now: at });
		if (!outcome.ok)
			throw new Error(
				`The demo's act “${what}” was refused: ${outcome.message} ${JSON.stringify(outcome.fields ?? {})}`
			);
	}
}
