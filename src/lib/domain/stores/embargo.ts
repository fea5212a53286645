import type { EmbargoField } from './words';

/** An embargo as far as time is concerned. */
export interface EmbargoTerm {
	field: EmbargoField;
	/** The first moment at which it may be told. */
	until: Date;
	liftedAt: Date | null;
}

/**
 * Whether an embargo still holds at a moment. It ends at `until`, to the millisecond, or when it was lifted.
 * Every way out asks this one function.
 * @example holds({ field: 'results', until, liftedAt: null }, new Date(until.getTime() - 1)) // true
 */
export const holds = (embargo: EmbargoTerm, at: Date): boolean =>
	embargo.liftedAt === null && at.getTime() < embargo.until.getTime();

/** The embargoes that still hold at a moment, the longest first; `field` 'everything' covers the others. */
export const holding = <E extends EmbargoTerm>(
	embargoes: readonly E[],
	at: Date,
	field?: EmbargoField
): E[] =>
	embargoes
		.filter(
			(embargo) =>
				holds(embargo, at) &&
				(field === undefined || embargo.field === field || embargo.field === 'everything')
		)
		.sort((a, b) => b.until.getTime() - a.until.getTime());
