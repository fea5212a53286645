import type { Rendered } from './render-article';

/**
 * A block of the page as it is put into a page that is drawn already. Its lines are counted from its own first line, so
 * that a line typed above changes `line` alone and the block is not drawn again.
 */
export interface PageBlock {
	/** The line of the source it begins on, from 1; null where it stands for no line of its own. */
	line: number | null;
	/** Not yet sanitised; `data-line` is 0 for what begins on `line`. */
	html: string;
}

/** A page block by block, lines taken out of the markup. Blocks that print nothing are left out. */
export const pageBlocks = ({ blocks }: Pick<Rendered, 'blocks'>): PageBlock[] =>
	blocks
		.filter(({ html }) => html !== '')
		.map(({ line, html }) => ({
			line,
			html:
				line === null
					? html
					: html.replace(/ data-line="(\d+)"/g, (_, own: string) => ` data-line="${Number(own) - line}"`)
		}));
