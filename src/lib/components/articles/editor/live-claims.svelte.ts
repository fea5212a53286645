import { claimsIn, type Binding, type Claim } from '../../../domain/articles/claims/claims';
import type { ArticleData } from '../../../domain/articles/data';
import type { ClaimsView } from './claim-marks';
import { nextToMend } from './claim-notes';

/** After the last key: the page comes first. */
const restMs = 250;

/** What the prose claims, looked through again once no key came for a moment, and what can be done about it. */
export class LiveClaims {
	found = $state.raw<Claim[]>([]);
	/** Counts what moves the notes beside the text; once a frame is enough. */
	layout = $state(0);
	private framed = false;
	private timer: ReturnType<typeof setTimeout> | undefined;
	private last = -1;

	constructor(
		source: string,
		private readonly data: () => ArticleData,
		private readonly view: () => ClaimsView | undefined,
		/** Shows the source where the page hides it. */
		private readonly reveal: () => void
	) {
		this.look(source);
	}

	typed(source: string): void {
		clearTimeout(this.timer);
		this.timer = setTimeout(() => this.look(source), restMs);
	}

	look(source: string): void {
		this.found = claimsIn(source, this.data());
	}

	stop(): void {
		clearTimeout(this.timer);
	}

	readonly moved = (): void => {
		if (this.framed) return;
		this.framed = true;
		requestAnimationFrame(() => {
			this.framed = false;
			this.layout += 1;
		});
	};

	readonly bind = (claim: Claim, binding: Binding): void => void this.view()?.bind(claim, binding);
	readonly setAside = (claim: Claim): void => void this.view()?.setAside(claim);
	readonly goTo = (claim: Claim): void => {
		this.reveal();
		this.view()?.goTo(claim);
	};
	/** The next that needs an eye. */
	readonly next = (): void => {
		const claim = nextToMend(this.found, this.last);
		this.last = claim?.from ?? -1;
		if (claim) this.goTo(claim);
	};
}
