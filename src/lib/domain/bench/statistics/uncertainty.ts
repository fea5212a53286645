import { studentQuantile } from './interval';
import { normalQuantile } from './normal';
import { spread } from './sides';

/** One input of a measurement, by its standard uncertainty. */
export interface Component {
	/** Standard uncertainty, in the input's unit. */
	u: number;
	/** Change of the result for a change of one of the input (∂f/∂x); 1 by default. */
	sensitivity?: number;
	/** Degrees of freedom; Infinity, the default, for a type B uncertainty held to be known. */
	df?: number;
}

/** Correlation of two inputs, by their places in the list of components. */
export interface Correlation {
	between: readonly [number, number];
	r: number;
}

/** Type A: the standard uncertainty of the mean of repeated readings (JCGM 100:2008, 4.2.3). RangeError below two. */
export function typeA(values: readonly number[]): Required<Pick<Component, 'u' | 'df'>> {
	const { n, sd } = spread(values);
	if (sd === null) throw new RangeError('A type A uncertainty needs two readings or more.');
	return { u: sd / Math.sqrt(n), df: n - 1 };
}

/** What each input adds to the result, with its sign: sensitivity × u, in the unit of the result. */
export const contributions = (components: readonly Component[]): number[] =>
	components.map(({ u, sensitivity = 1 }) => {
		if (!(u >= 0 && Number.isFinite(u) && Number.isFinite(sensitivity))) {
			throw new RangeError('A standard uncertainty is a finite number, zero or above.');
		}
		return u * sensitivity;
	});

/**
 * Combined standard uncertainty to first order, in the unit of the result.
 * RangeError for a correlation outside −1 to 1 or of an input that is not there. Source: JCGM 100:2008, 5.1.2 and 5.2.2.
 */
export function combined(
	components: readonly Component[],
	correlations: readonly Correlation[] = []
): number {
	const parts = contributions(components);
	let variance = parts.reduce((sum, part) => sum + part ** 2, 0);
	for (const { between, r } of correlations) {
		const [a, b] = [parts[between[0]], parts[between[1]]];
		if (a === undefined || b === undefined || between[0] === between[1] || !(Math.abs(r) <= 1)) {
			throw new RangeError('A correlation lies between −1 and 1, of two inputs of the list.');
		}
		variance += 2 * a * b * r;
	}
	// Correlations close to −1 may leave a hair below zero.
	return Math.sqrt(Math.max(0, variance));
}

/**
 * Effective degrees of freedom of a combined uncertainty (Welch–Satterthwaite), for independent inputs; Infinity where
 * all are known. Source: JCGM 100:2008, G.4.1.
 */
export function effectiveDf(components: readonly Component[]): number {
	const parts = contributions(components);
	const weight = components.reduce((sum, { df = Infinity }, index) => {
		if (!(df > 0)) throw new RangeError('Degrees of freedom must be above zero.');
		return sum + (parts[index] ?? 0) ** 4 / df;
	}, 0);
	return weight === 0 ? Infinity : combined(components) ** 4 / weight;
}

/**
 * Coverage factor k of an expanded uncertainty: Student's t at the degrees of freedom cut to whole ones, as the GUM
 * does, or the normal quantile without end. RangeError below one. Source: JCGM 100:2008, G.4.1 and table G.2.
 * @example coverageFactor(16.66, 0.99) // 2.9208
 */
export const coverageFactor = (df: number, level = 0.95): number =>
	Number.isFinite(df)
		? studentQuantile((1 + level) / 2, Math.floor(df * (1 + 1e-12)))
		: normalQuantile((1 + level) / 2);

export interface Expanded {
	/** Combined standard uncertainty. */
	u: number;
	df: number;
	k: number;
	/** k · u, in the unit of the result. */
	expanded: number;
}

/** Combined and expanded uncertainty of independent inputs in one step. */
export function expand(components: readonly Component[], level = 0.95): Expanded {
	const [u, df] = [combined(components), effectiveDf(components)];
	const k = coverageFactor(df, level);
	return { u, df, k, expanded: k * u };
}

/** A factor of a product: its value, its uncertainty, and its power (1; −1 for a divisor). */
export interface Factor extends Pick<Component, 'u' | 'df'> {
	value: number;
	power?: number;
}

/**
 * A product of powers as components of relative uncertainty: u(x)/|x| with the power as sensitivity, for `combined`,
 * `effectiveDf` and `expand`. RangeError for a factor of zero. Source: JCGM 100:2008, 5.1.6.
 */
export const relativeComponents = (factors: readonly Factor[]): Component[] =>
	factors.map(({ value, u, df, power = 1 }) => {
		if (value === 0 || !Number.isFinite(value))
			throw new RangeError('A factor of zero has no relative uncertainty.');
		return { u: u / Math.abs(value), sensitivity: power, df };
	});
