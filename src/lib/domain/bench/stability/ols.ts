import { linearRegression, mean, sum } from 'simple-statistics';
import { studentQuantile } from '../statistics/interval';

export interface LineFit {
	n: number;
	/** In the unit of y. */
	intercept: number;
	/** In the unit of y per unit of x. */
	slope: number;
	/** Standard errors of the two. */
	interceptSe: number;
	slopeSe: number;
	/** Standard deviation of the residuals on n − 2 degrees of freedom, in the unit of y. */
	residualSd: number;
	/** Null where y does not vary. */
	rSquared: number | null;
	/** y less the line, in the order given. */
	residuals: number[];
	meanX: number;
	/** Sum of the squared deviations of x. */
	squaresX: number;
}

const squares = (values: readonly number[], centre: number): number =>
	sum(values.map((value) => (value - centre) ** 2));

/**
 * The straight line through points by ordinary least squares, with the standard errors of its two numbers.
 * Sources: NIST StRD, linear regression; NIST/SEMATECH e-Handbook §4.1.4.1.
 * RangeError with fewer than three points, lists of unequal length, a value that is not finite, or x without spread.
 */
export function leastSquares(x: readonly number[], y: readonly number[]): LineFit {
	const n = x.length;
	if (y.length !== n) throw new RangeError('A line needs as many values of y as of x.');
	if (n < 3) throw new RangeError('A line with its errors needs three points or more.');
	if (![...x, ...y].every(Number.isFinite)) throw new RangeError('Every point must be finite.');
	const meanX = mean([...x]);
	const squaresX = squares(x, meanX);
	const widest = Math.max(...x.map(Math.abs));
	if (!(Math.max(...x) - Math.min(...x) > 1e-9 * widest && squaresX > 0))
		throw new RangeError('A line needs points that differ in x.');
	const { m: slope, b: intercept } = linearRegression(x.map((value, index) => [value, y[index] ?? 0]));
	const residuals = x.map((value, index) => (y[index] ?? 0) - (intercept + slope * value));
	const left = squares(residuals, 0);
	const squaresY = squares(y, mean([...y]));
	const residualSd = Math.sqrt(left / (n - 2));
	return {
		n,
		intercept,
		slope,
		interceptSe: residualSd * Math.sqrt(1 / n + meanX ** 2 / squaresX),
		slopeSe: residualSd / Math.sqrt(squaresX),
		residualSd,
		rSquared: squaresY > 0 ? 1 - left / squaresY : null,
		residuals,
		meanX,
		squaresX
	};
}

export interface Predicted {
	value: number;
	/** 95 % interval of the line itself there. */
	line95: [number, number];
	/** 95 % interval of one further reading there. */
	reading95: [number, number];
}

/** What a fitted line says at an x, in the unit of y. Source: NIST/SEMATECH e-Handbook §4.5.1. */
export function predictAt(fit: LineFit, x: number): Predicted {
	const value = fit.intercept + fit.slope * x;
	const lever = 1 / fit.n + (x - fit.meanX) ** 2 / fit.squaresX;
	const spread = studentQuantile(0.975, fit.n - 2) * fit.residualSd;
	const within = (half: number): [number, number] => [value - half, value + half];
	return {
		value,
		line95: within(spread * Math.sqrt(lever)),
		reading95: within(spread * Math.sqrt(1 + lever))
	};
}
