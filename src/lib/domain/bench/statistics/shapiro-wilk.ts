import { normalQuantile, normalUpperTail } from './normal';

/** Polynomial by Horner's rule, constant first. */
const polynomial = (coefficients: readonly number[], x: number): number =>
	coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);

/** Weights of the upper half, farthest from the middle first. */
function weights(n: number): number[] {
	if (n === 3) return [Math.SQRT1_2];
	const scores = Array.from(
		{ length: Math.floor(n / 2) },
		(_, i) => -normalQuantile((i + 0.625) / (n + 0.25))
	);
	const squares = 2 * scores.reduce((sum, score) => sum + score ** 2, 0);
	const [first = 0, second = 0] = scores;
	const root = 1 / Math.sqrt(n);
	const a = polynomial(
		[first / Math.sqrt(squares), 0.221157, -0.147981, -2.07119, 4.434685, -2.706056],
		root
	);
	if (n <= 5) {
		const scale = Math.sqrt((squares - 2 * first ** 2) / (1 - 2 * a ** 2));
		return [a, ...scores.slice(1).map((score) => score / scale)];
	}
	const b = polynomial(
		[second / Math.sqrt(squares), 0.042981, -0.293762, -1.752461, 5.682633, -3.582633],
		root
	);
	const scale = Math.sqrt((squares - 2 * first ** 2 - 2 * second ** 2) / (1 - 2 * a ** 2 - 2 * b ** 2));
	return [a, b, ...scores.slice(2).map((score) => score / scale)];
}

function pOf(w: number, n: number): number {
	if (n === 3)
		return Math.min(1, Math.max(0, (6 / Math.PI) * (Math.asin(Math.sqrt(w)) - Math.asin(Math.sqrt(0.75)))));
	const y = Math.log(1 - w);
	const x = Math.log(n);
	if (n > 11) {
		const mean = polynomial([-1.5861, -0.31082, -0.083751, 0.0038915], x);
		return normalUpperTail((y - mean) / Math.exp(polynomial([-0.4803, -0.082676, 0.0030302], x)));
	}
	const bound = polynomial([-2.273, 0.459], n);
	if (y >= bound) return 0;
	const mean = polynomial([0.544, -0.39978, 0.025054, -6.714e-4], n);
	const sd = Math.exp(polynomial([1.3822, -0.77857, 0.062767, -0.0020322], n));
	return normalUpperTail((-Math.log(bound - y) - mean) / sd);
}

/**
 * Shapiro and Wilk's W with its p-value, for 3 to 50 readings: small p, small likelihood of a normal distribution.
 * RangeError outside that, for readings that are not finite, or that do not vary.
 * Source: Royston 1995, algorithm AS R94 (as R's `shapiro.test`).
 * @example shapiroWilk([148, 154, 158, 160, 161, 162, 166, 170, 182, 195, 236]) // w 0.7888…, p 0.0067…
 */
export function shapiroWilk(values: readonly number[]): { w: number; p: number } {
	const n = values.length;
	if (n < 3 || n > 50) throw new RangeError('Shapiro and Wilk’s test takes 3 to 50 readings.');
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const sorted = [...values].sort((a, b) => a - b);
	const low = sorted[0] ?? 0;
	const range = (sorted[n - 1] ?? 0) - low;
	if (!(range > 0)) throw new RangeError('Shapiro and Wilk’s test needs readings that vary.');
	const scaled = sorted.map((value) => (value - low) / range);
	const mean = scaled.reduce((sum, value) => sum + value, 0) / n;
	const total = scaled.reduce((sum, value) => sum + (value - mean) ** 2, 0);
	const spread = weights(n).reduce(
		(sum, weight, i) => sum + weight * ((scaled[n - 1 - i] ?? 0) - (scaled[i] ?? 0)),
		0
	);
	const w = Math.min(1, spread ** 2 / total);
	return { w, p: pOf(w, n) };
}
