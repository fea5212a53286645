export type DatumKind =
	| 'reading'
	| 'spread'
	| 'gain'
	| 'change'
	| 'overall'
	| 'difference'
	| 'setting'
	| 'method'
	| 'price'
	| 'ambient'
	| 'switch-point';

/** One stored or derived value that a number in prose may be. */
export interface Datum {
	kind: DatumKind;
	value: number;
	unit: string;
	interval: [number, number] | null;
	/** Slugs, where they apply. */
	campaign: string;
	workload: string | null;
	profile: string | null;
	over: string | null;
	/** Names of a setting or a part, as people call it. */
	called: string | null;
	/** What it is of, for a note. @example 'Prime sieve, Fixed 4.95' */
	name: string;
	/** As print would have it, and its interval. */
	printed: string;
	range: string | null;
}

/** A gain with its ratio, turned so that above 1 is better, and the quantity's own change. */
export interface Held extends Datum {
	ratio: number;
	/** Profile over baseline in the workload's own quantity. */
	quotient: number;
	lowerIsBetter: boolean;
}

/** A name without what stands behind its comma, for a note. */
export const front = (name: string): string => name.split(/,(?!\d)/)[0] ?? name;
