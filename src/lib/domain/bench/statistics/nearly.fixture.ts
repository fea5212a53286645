/** Relative distance of a figure from the published one, for the tests; absolute where that is zero. */
export const relative = (ours: number, published: number): number =>
	Math.abs(ours - published) / (Math.abs(published) || 1);
