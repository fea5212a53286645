import { probit, shuffle } from 'simple-statistics';

/** A small generator of pseudo-random numbers from 0 to 1, the same for the same name (mulberry32 over FNV-1a). */
export function seeded(name: string): () => number {
	let state = 0x811c9dc5;
	for (const letter of name) state = Math.imul(state ^ letter.charCodeAt(0), 0x01000193);
	return () => {
		state = (state + 0x6d2b79f5) | 0;
		let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
		mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
		return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
	};
}

/**
 * Readings as a calm bench gives them: near normal scores around a mean, in an order of chance, none far from the
 * others, so that what the demo's articles say of them holds.
 * @param cvPercent about what their coefficient of variation will be
 */
export function readingsAround(
	name: string,
	{ mean, cvPercent, n, decimals }: { mean: number; cvPercent: number; n: number; decimals: number }
): number[] {
	const random = seeded(name);
	const scores = Array.from({ length: n }, (_, i) => probit((i + 0.625) / (n + 0.25)));
	const spread = (cvPercent / 100) * (0.75 + 0.5 * random());
	return shuffle(scores, random).map((score) =>
		Number((mean * (1 + spread * (score + 0.3 * (random() - 0.5)))).toFixed(decimals))
	);
}
