import type { Token } from 'marked';
import type { ArticleData } from './data';
import type { Draw } from './directives/shape';
import { errorHtml } from './error-html';
import { refusalOf } from './limits';
import { parseMarkdown } from './markdown';
import { emptyPage, type DirectiveError, type Rendered } from './rendered';
import { Setting } from './setting';

export type { Heading } from './directives/shape';
export type { DirectiveError, Rendered } from './rendered';

export interface RenderOptions {
	/** Where the plates' files are, with a slash at its end. */
	platesAt?: string;
	/** Gives the token tree, as a reader that knows the text from before does. */
	read?: (source: string) => Token[];
}

/**
 * Sets an article: Markdown and directives in, page and everything found out about it. The same function makes
 * the preview, the edition and the site's page. Its HTML must still pass the sanitiser, which is the last step.
 * Nothing throws for what a writer typed: it is an error in its place.
 * @param draw gives the SVG of a plate
 */
export const renderArticle = (
	source: string,
	data: ArticleData,
	draw: Draw,
	options: RenderOptions = {}
): Rendered => setArticle(source, data, draw, options).page;

/** The same, with the token tree it was printed from: settled, each directive with what it says. */
export function setArticle(
	source: string,
	data: ArticleData,
	draw: Draw,
	{ platesAt = 'plates/', read = parseMarkdown }: RenderOptions = {}
): { tokens: Token[]; page: Rendered } {
	const refusal = refusalOf(source);
	if (refusal) return refused(refusal.message, refusal.line);
	let tokens: Token[];
	try {
		tokens = read(source);
	} catch (error) {
		if (!(error instanceof RangeError)) throw error;
		return refused(
			'This text is nested too deep to be set. Take some levels out. What you typed is kept.',
			1
		);
	}
	return { tokens, page: new Setting(data, draw, platesAt).set(tokens) };
}

function refused(message: string, line: number): { tokens: Token[]; page: Rendered } {
	const error: DirectiveError = { line, directive: 'source', message, nearest: [] };
	const html = errorHtml(error, 'block');
	return { tokens: [], page: { ...emptyPage(), errors: [error], html, blocks: [{ line, html }] } };
}
