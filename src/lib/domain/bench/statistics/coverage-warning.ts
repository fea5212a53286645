export const intervalMethods = ['mean', 'ratio', 'overall', 'ratio-of-medians'] as const;
/** The intervals that are printed: Student's of a mean, Fieller's of a ratio, of the geometric mean, Price & Bonett's. */
export type IntervalMethod = (typeof intervalMethods)[number];

/**
 * Campaigns of 100 in which a 95 % interval held the truth, least and most over like and unlike scatter of the two
 * sides, where that is not 94 to 96. Simulated on normal readings, 20,000 campaigns or more each (`npm run bench`
 * repeats it); whatever is not listed kept its level.
 */
const heldOf100: Record<IntervalMethod, Readonly<Record<number, readonly [number, number]>>> = {
	mean: {},
	ratio: { 2: [92, 98] },
	overall: {},
	'ratio-of-medians': { 2: [81, 90], 3: [89, 94], 6: [97, 97], 7: [97, 97], 10: [96, 97] }
};

/**
 * Words for the screen where an interval is known to hold the truth more or less often than the 95 % it names; null
 * where it keeps its word.
 * @param n readings of the side with fewer
 * @example coverageWarning('ratio-of-medians', 3) // 'With 3 readings a side this interval …'
 */
export function coverageWarning(method: IntervalMethod, n: number): string | null {
	const held = heldOf100[method][n];
	if (!held) return null;
	const [least, most] = held;
	const range = least === most ? `about ${most}` : `${least} to ${most}`;
	const often = `With ${n} readings a side this interval holds the truth in ${range} of 100 campaigns, not in 95`;
	return least < 94
		? `${often}. Take it as too narrow until there are more readings.`
		: `${often}: a little wider than it need be.`;
}
