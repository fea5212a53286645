/** A place that is in both: how far down it stands in one and in the other, in pixels. */
export interface Anchor {
	from: number;
	to: number;
}

/** Anchors in order of both sides; what stands out of order (a note printed elsewhere) is passed over. */
export function inOrder(anchors: readonly Anchor[]): Anchor[] {
	const kept: Anchor[] = [];
	for (const anchor of [...anchors].sort((a, b) => a.from - b.from || a.to - b.to)) {
		const last = kept.at(-1);
		if (!last || (anchor.from > last.from && anchor.to >= last.to)) kept.push(anchor);
	}
	return kept;
}

/**
 * How far the other side is scrolled when this one is at `top`: between two anchors it goes along in proportion, and
 * both reach their ends together.
 * @param anchors in order, see `inOrder`
 * @param ends how far each can be scrolled
 */
export function inStep(top: number, anchors: readonly Anchor[], ends: Anchor): number {
	if (top <= 0) return 0;
	if (top >= ends.from) return ends.to;
	const within = anchors.filter(({ from, to }) => from > 0 && from < ends.from && to < ends.to);
	const at = within.findLastIndex(({ from }) => from <= top);
	const above = within[at] ?? { from: 0, to: 0 };
	const below = within[at + 1] ?? ends;
	const share = below.from > above.from ? (top - above.from) / (below.from - above.from) : 0;
	return Math.min(ends.to, Math.max(0, above.to + share * (below.to - above.to)));
}
