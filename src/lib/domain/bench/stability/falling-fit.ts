import { isotonic } from './isotonic';

export interface Fitted {
	currentA: number;
	/** Never rises with the current. */
	clockMHz: number;
	/** How many readings stand at this current. */
	count: number;
}

/**
 * Clock over current with the rises taken out: readings at the same current are averaged, then the falling isotonic
 * fit is drawn through them, each current weighing as many readings as it has. Sorted by current.
 * RangeError for a reading that is not finite.
 */
export function fallingFit(points: readonly { currentA: number; clockMHz: number }[]): Fitted[] {
	const sums = new Map<number, { sum: number; count: number }>();
	for (const { currentA, clockMHz } of points) {
		if (!Number.isFinite(currentA)) throw new RangeError('Every current must be finite.');
		const { sum, count } = sums.get(currentA) ?? { sum: 0, count: 0 };
		sums.set(currentA, { sum: sum + clockMHz, count: count + 1 });
	}
	const at = [...sums].sort(([a], [b]) => a - b);
	const fit = isotonic(
		at.map(([, { sum, count }]) => sum / count),
		{ weights: at.map(([, { count }]) => count), direction: 'falling' }
	);
	return at.map(([currentA, { count }], index) => ({ currentA, clockMHz: fit[index] ?? NaN, count }));
}
