const n = (value: number): string => String(Math.round(value * 10) / 10);

/** A cross over the place of a series' own mark: it failed there. */
export const failedMark = (x: number, y: number): string =>
	`M${n(x - 6)} ${n(y - 6)}l12 12M${n(x + 6)} ${n(y - 6)}l-12 12`;

/** A bar: stopped by hand, which says nothing either way. */
export const stoppedMark = (x: number, y: number): string => `M${n(x - 6)} ${n(y)}h12`;
