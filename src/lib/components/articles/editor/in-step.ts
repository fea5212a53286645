import { inOrder, inStep, type Anchor } from '../../../domain/articles/scroll-step';

/**
 * Keeps source and page scrolled to the same place. Whichever a person scrolls leads; what is scrolled for it is known
 * by where it was put, so that it does not lead back.
 */
export class InStep {
	private anchors: Anchor[] | null = null;
	private readonly put = new Map<HTMLElement, number>();

	/** @param measure where each line stands in the source (`from`) and on the page (`to`) */
	constructor(
		private readonly source: HTMLElement,
		private readonly page: HTMLElement,
		private readonly measure: () => Anchor[]
	) {}

	/** What stands where is measured anew before the next step: the text, a plate or a width changed. */
	moved(): void {
		this.anchors = null;
	}

	/** One of the two was scrolled. */
	scrolled(side: 'source' | 'page'): void {
		const leader = this[side];
		const other = side === 'source' ? this.page : this.source;
		const expected = this.put.get(leader);
		this.put.delete(leader);
		if (expected !== undefined && Math.abs(leader.scrollTop - expected) <= 1.5) return;
		this.anchors ??= inOrder(this.measure());
		const [lead, follow] = [leader, other].map((one) => one.scrollHeight - one.clientHeight);
		const anchors =
			side === 'source'
				? this.anchors
				: inOrder(this.anchors.map(({ from, to }) => ({ from: to, to: from })));
		this.scrollTo(other, inStep(leader.scrollTop, anchors, { from: lead ?? 0, to: follow ?? 0 }));
	}

	/** Scrolls one of them without the other following. */
	scrollTo(scroller: HTMLElement, top: number): void {
		const before = scroller.scrollTop;
		scroller.scrollTop = top;
		// No event comes where nothing moved, and the place may be a fraction off the one asked for.
		if (scroller.scrollTop !== before) this.put.set(scroller, scroller.scrollTop);
	}
}
