import { element, escapeHtml } from './html';
import type { DirectiveError } from './rendered';

/** An error in its place on the page. */
export function errorHtml(error: DirectiveError, level: 'inline' | 'block'): string {
	const near = error.nearest.length > 0 ? ` Near: ${error.nearest.join(', ')}.` : '';
	return element(
		level === 'inline' ? 'span' : 'p',
		{ class: 'directive-error', role: 'note', 'data-line': error.line },
		escapeHtml(`${error.message}${near}`)
	);
}
