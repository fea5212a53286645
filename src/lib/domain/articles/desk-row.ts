import type { Stage } from './stage';

/** How far the campaigns behind an article are, added up. */
export interface BenchProgress {
	cells: number;
	signed: number;
	needed: number;
	taken: number;
}

/** Adds campaigns up. */
export const addProgress = (all: BenchProgress[]): BenchProgress =>
	all.reduce(
		(sum, one) => ({
			cells: sum.cells + one.cells,
			signed: sum.signed + one.signed,
			needed: sum.needed + one.needed,
			taken: sum.taken + one.taken
		}),
		{ cells: 0, signed: 0, needed: 0, taken: 0 }
	);

/** The bench in a few words: readings while some are missing, then signatures, then that all is signed. */
export function benchWords({ cells, signed, needed, taken }: BenchProgress): string {
	if (cells === 0) return 'no campaign';
	if (signed >= cells) return 'signed';
	return taken < needed ? `${taken} of ${needed}` : `${signed} of ${cells} signed`;
}

/** What the list knows of an article's way into print without rendering it. */
export interface PrintState {
	stage: Stage;
	slotAt: Date | null;
	bench: BenchProgress;
	blockingComments: number;
	/** The last embargo that stands; null for none. */
	embargoUntil: Date | null;
}

/**
 * What stands before print, as far as the list knows. It gives words and no number of things to mend: that number is the
 * preflight's, which counts what the rendered page shows, and two counts of one thing would not agree.
 */
export function beforePrint(state: PrintState): {
	embargo: Date | null;
	clear: boolean;
	parts: string[];
} {
	const { stage, slotAt, bench, blockingComments, embargoUntil } = state;
	const unsigned = bench.cells - bench.signed;
	// What is approved has passed the whole preflight; its page no longer depends on the bench.
	const frozen = stage === 'approved' || stage === 'scheduled';
	const parts = [
		...(blockingComments > 0
			? [`${blockingComments} blocking comment${blockingComments === 1 ? '' : 's'}`]
			: []),
		...(!frozen && unsigned > 0 ? ['cells not signed off'] : []),
		...(embargoUntil && slotAt && slotAt < embargoUntil ? ['a slot before the embargo ends'] : [])
	];
	const embargo = embargoUntil && (!slotAt || slotAt < embargoUntil) ? embargoUntil : null;
	return { embargo, clear: frozen && parts.length === 0 && embargo === null, parts };
}
