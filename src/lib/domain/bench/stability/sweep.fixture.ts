/** An invented sweep, in which boost falls under 5400 MHz at 163.333 A (R's approx on the antitonic fit). */
export const sweep = [
	[120, 5500],
	[130, 5500],
	[140, 5475],
	[150, 5480],
	[160, 5425],
	[170, 5350],
	[180, 5300]
].map(([currentA = NaN, clockMHz = NaN]) => ({ currentA, clockMHz }));

/** The same sweep with every current moved. */
export const moved = (byA: number) =>
	sweep.map(({ currentA, clockMHz }) => ({ currentA: currentA + byA, clockMHz }));
