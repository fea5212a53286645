import { shapiroWilk } from './shapiro-wilk';

/** Below this many readings nothing is said: the test can hardly speak there (common practice, no source). */
const fewest = 8;
const most = 50;

export interface NormalityHint {
	w: number;
	p: number;
	/** One sentence for the screen; a hint to look, never a gate. */
	words: string;
}

/**
 * A hint of how the readings are spread, from Shapiro and Wilk's test; null below 8 readings, above 50, and where
 * nothing varies. Nothing is ever refused or corrected because of it.
 */
export function normalityHint(values: readonly number[]): NormalityHint | null {
	if (values.length < fewest || values.length > most) return null;
	if (values.every((value) => value === values[0])) return null;
	const { w, p } = shapiroWilk(values);
	const words =
		p < 0.05
			? 'The readings do not look evenly scattered about a middle. Look for drift, warm-up or two kinds of run, and consider the median.'
			: 'Nothing in the readings speaks against an even scatter about the mean; with so few that proves little.';
	return { w, p, words };
}
