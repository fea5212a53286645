import { SvelteMap } from 'svelte/reactivity';
import type { PlateSpec } from '../../../domain/articles/plates/spec';
import { plateKey } from '../../../domain/articles/plates/spec';

/** Fetches drawings of plates, in order; none where it could not. */
export type FetchPlates = (specs: PlateSpec[]) => Promise<string[]>;

const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;' };
const waiting = (spec: PlateSpec) =>
	`<p class="plate-waiting">Drawing “${spec.title.replace(/[&<>]/g, (sign) => escapes[sign] ?? sign)}” …</p>`;

/** The drawings a page needs: what is there at once, what is not asked for together and once. */
export class PlateDrawings {
	private readonly drawn: SvelteMap<string, string>;
	private readonly asked: Record<string, boolean> = {};
	private queue: PlateSpec[] = [];
	private timer: ReturnType<typeof setTimeout> | undefined;

	constructor(
		first: Record<string, string>,
		private readonly fetchPlates: FetchPlates
	) {
		this.drawn = new SvelteMap(Object.entries(first));
	}

	/** The SVG of a plate, or words in its place until it is drawn. Reading it makes the page follow. */
	readonly draw = (spec: PlateSpec): string => {
		const key = plateKey(spec);
		const svg = this.drawn.get(key);
		if (svg !== undefined) return svg;
		if (!this.asked[key]) {
			this.asked[key] = true;
			this.queue.push(spec);
			clearTimeout(this.timer);
			this.timer = setTimeout(() => void this.fetchQueued(), 80);
		}
		return waiting(spec);
	};

	private async fetchQueued(): Promise<void> {
		const specs = this.queue;
		this.queue = [];
		const found = await this.fetchPlates(specs);
		for (const [index, spec] of specs.entries()) {
			const key = plateKey(spec);
			const svg = found[index];
			// What could not be drawn now is asked for again by the next change of the text.
			if (svg === undefined) this.asked[key] = false;
			else this.drawn.set(key, svg);
		}
	}
}
