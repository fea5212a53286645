export type Crossing =
	| { kind: 'crosses'; at: number }
	/** Never under the wanted value at what was measured. */
	| { kind: 'not-reached' }
	/** Under the wanted value from the first point on. */
	| { kind: 'always-below' };

/**
 * Where a falling line through points falls under a wanted value: linear between neighbours, nothing beyond the ends.
 * A point exactly at the wanted value is not under it.
 * @param points ascending in x, never rising in y; RangeError where they are not, or where there are none
 */
export function fallsUnder(points: readonly { x: number; y: number }[], wanted: number): Crossing {
	const [first, ...others] = points;
	if (!first) throw new RangeError('A crossing needs points.');
	if (first.y < wanted) return { kind: 'always-below' };
	let before = first;
	let at: number | null = null;
	for (const point of others) {
		if (!(point.x > before.x && point.y <= before.y))
			throw new RangeError('A crossing needs points that rise in x and never rise in y.');
		if (at === null && point.y < wanted)
			at = before.x + ((before.y - wanted) / (before.y - point.y)) * (point.x - before.x);
		before = point;
	}
	return at === null ? { kind: 'not-reached' } : { kind: 'crosses', at };
}
