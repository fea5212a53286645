/** A number within a formula: eight significant digits, no nought behind them. */
export const short = (value: number): string => String(Number(value.toPrecision(8)));

/** Decimals that print a value without noughts at its end, up to a most. @example decimalsUpTo(13.75, 3) // 2 */
export const decimalsUpTo = (value: number, most: number): number =>
	(String(Number(value.toFixed(most))).split('.')[1] ?? '').length;
