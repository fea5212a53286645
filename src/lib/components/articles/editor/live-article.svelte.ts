import { flushSync } from 'svelte';
import { sanitisePreview } from '../../../articles-preview/sanitise-preview';
import type { ArticleData } from '../../../domain/articles/data';
import { ArticleReader } from '../../../domain/articles/lex-again';
import { faultsOf } from '../../../domain/articles/mends';
import { pageBlocks } from '../../../domain/articles/page-blocks';
import { renderArticle } from '../../../domain/articles/render-article';
import { peekOf, type Peek } from './peek-directive';
import type { PlateDrawings } from './plate-drawings.svelte';

export interface LiveArticleOptions {
	source: string;
	data: () => ArticleData;
	drawings: PlateDrawings;
	/** Where the plates' files are, with a slash at its end. */
	platesAt: string;
}

/** Longer than this, and a page takes keys' time: it is then drawn less often. */
const quickMs = 40;

/** The article as it is typed: what its page shows, drawn once a frame, and what was found out about it. */
export class LiveArticle {
	/** The source the page is drawn from, a frame behind the keys. */
	private drawn = $state('');
	private next = '';
	private frame = 0;
	private tookMs = 0;
	private readonly reader = new ArticleReader();

	readonly rendered = $derived.by(() => this.render(this.drawn, this.reader.read));
	readonly blocks = $derived(pageBlocks(this.rendered));
	readonly faults = $derived(faultsOf(this.drawn, this.rendered.errors));

	constructor(private readonly options: LiveArticleOptions) {
		this.drawn = options.source;
	}

	private render(source: string, read?: ArticleReader['read']) {
		const { data, drawings, platesAt } = this.options;
		return renderArticle(source, data(), drawings.draw, { platesAt, ...(read && { read }) });
	}

	/** A key was typed: the page follows with the next frame, later where it takes long. */
	typed(source: string): void {
		this.next = source;
		if (this.frame !== 0) return;
		const draw = () => {
			this.frame = 0;
			const began = performance.now();
			flushSync(() => this.show(this.next));
			this.tookMs = performance.now() - began;
		};
		if (this.tookMs <= quickMs) this.frame = requestAnimationFrame(draw);
		else this.frame = window.setTimeout(draw, Math.min(this.tookMs * 1.5, 500));
	}

	/** Draws a text now. */
	show(source: string): void {
		this.next = source;
		this.drawn = source;
	}

	/** A piece of source as the page would show it, sanitised. */
	readonly preview = (source: string) => {
		const piece = this.render(source);
		return { html: sanitisePreview(piece.html), errors: piece.errors };
	};

	/** What one directive would print. */
	readonly peek = (source: string): Peek | null => {
		const piece = this.render(source);
		return peekOf(piece, sanitisePreview(piece.html));
	};
}
