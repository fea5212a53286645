import type { ArticleData, GlossaryTerm } from './data';
import { element, escapeHtml } from './html';

/** The terms that a page uses, in alphabetical order. */
function used(data: ArticleData, slugs: readonly string[]): GlossaryTerm[] {
	const names = new Set(slugs);
	return (data.glossary ?? [])
		.filter(({ slug }) => names.has(slug))
		.sort((a, b) => a.term.localeCompare(b.term, 'en'));
}

/** The explanations at the article's end, each with a way back; empty where no term is used. */
export function termsHtml(data: ArticleData, slugs: readonly string[]): string {
	const items = used(data, slugs).map(
		({ slug, term, explanation }) =>
			element('dt', { id: `term-${slug}` }, escapeHtml(term)) +
			element(
				'dd',
				{},
				`${escapeHtml(explanation)} ${element('a', { href: `#tr-${slug}`, 'aria-label': `Back to where ${term} first stands` }, 'back')}`
			)
	);
	return items.length === 0
		? ''
		: element(
				'section',
				{ class: 'terms', 'aria-label': 'Terms' },
				`<h2>Terms</h2><dl>${items.join('')}</dl>`
			);
}

/** The same as plain text. */
export const termsPlain = (data: ArticleData, slugs: readonly string[]): string =>
	used(data, slugs)
		.map(({ term, explanation }) => `${term}: ${explanation}`)
		.join('\n\n');
