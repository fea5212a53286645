/** Rolls a box at a speed, frame by frame, from wherever somebody scrolled it to. */
export class Roll {
	runs = $state(false);
	/** Whole and part pixels: what a box scrolls to is rounded, and slow text would stand still. */
	private at: number | null = null;

	toggle(): void {
		this.runs = !this.runs;
		this.at = null;
	}

	/** Somebody moved the text: go on from there. */
	moved(): void {
		this.at = null;
	}

	/** @param speed pixels a second, asked at each frame */
	begin(box: HTMLElement, speed: () => number): () => void {
		let last = performance.now();
		let frame = requestAnimationFrame(function step(this: void, now) {
			roll(now - last);
			last = now;
			frame = requestAnimationFrame(step);
		});
		const roll = (ms: number) => {
			if (!this.runs) return;
			const from = this.at ?? box.scrollTop;
			const end = box.scrollHeight - box.clientHeight;
			this.at = Math.min(end, from + (speed() * Math.min(ms, 100)) / 1000);
			box.scrollTop = this.at;
			if (this.at >= end) this.runs = false;
		};
		return () => cancelAnimationFrame(frame);
	}
}
