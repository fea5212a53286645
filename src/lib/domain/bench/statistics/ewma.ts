export interface EwmaPoint {
	ewma: number;
	lower: number;
	upper: number;
}

/**
 * Exponentially weighted moving average, reading by reading, with its limits, which widen from the first on:
 * centre ± L σ √(λ/(2 − λ) · (1 − (1 − λ)^2t)). Unit: that of the readings. Asked to begin anew, it starts at the
 * centre with that reading, and t at 1.
 * RangeError for a weight outside 0 < λ ≤ 1. Source: NIST/SEMATECH e-Handbook §6.3.2.4; Lucas & Saccucci 1990.
 * @param lambda weight of the newest reading, such as 0.2
 * @param width L, such as 2.7
 */
export function ewmaFrom(
	{ centre, sigma }: { centre: number; sigma: number },
	lambda: number,
	width: number
): (value: number, anew?: boolean) => EwmaPoint {
	if (!(lambda > 0 && lambda <= 1))
		throw new RangeError('The weight of the newest reading lies above 0, up to 1.');
	let average = centre;
	let t = 0;
	return (value, anew = false) => {
		if (anew) [average, t] = [centre, 0];
		t += 1;
		average = lambda * value + (1 - lambda) * average;
		const share = (lambda / (2 - lambda)) * (1 - (1 - lambda) ** (2 * t));
		const half = width * sigma * Math.sqrt(share);
		return { ewma: average, lower: centre - half, upper: centre + half };
	};
}

/** The same of a whole series that is never begun anew. */
export function ewma(
	values: readonly number[],
	limits: { centre: number; sigma: number },
	lambda: number,
	width: number
): EwmaPoint[] {
	const step = ewmaFrom(limits, lambda, width);
	return values.map((value) => step(value));
}
