/**
 * Holm's step-down adjusted p-values, in the order given: all claims below 0.05 among them are right together in
 * 95 % of tables. RangeError for a value that is not between 0 and 1. Source: Holm 1979; as R's `p.adjust`.
 * @example holm([0.01, 0.04, 0.03]) // [0.03, 0.06, 0.06]
 */
export function holm(pValues: readonly number[]): number[] {
	if (!pValues.every((p) => p >= 0 && p <= 1)) throw new RangeError('A p-value lies between 0 and 1.');
	const ascending = pValues.map((p, index) => ({ p, index })).sort((a, b) => a.p - b.p);
	const adjusted = new Array<number>(pValues.length).fill(1);
	let most = 0;
	ascending.forEach(({ p, index }, step) => {
		most = Math.max(most, Math.min(1, (pValues.length - step) * p));
		adjusted[index] = most;
	});
	return adjusted;
}
