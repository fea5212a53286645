import type { GlossaryTerm } from '../data';
import { element, escapeHtml } from '../html';
import { unknownName } from '../names-near';
import { attribute } from './lookup';
import { directive, found, missing } from './shape';

const same = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();

interface Found {
	term: GlossaryTerm;
	/** The word it was called by, where that is not its slug. */
	called: string;
}

/** A term by its slug, its word or one of its other words. */
function termOf(terms: readonly GlossaryTerm[], name: string): Found | null {
	const bySlug = terms.find(({ slug }) => slug === name);
	if (bySlug) return { term: bySlug, called: bySlug.term };
	const term = terms.find((one) => [one.term, ...(one.aliases ?? [])].some((word) => same(word, name)));
	return term ? { term, called: name } : null;
}

/** `:term{name=}`: a word of the glossary, with its explanation at the article's end. */
export const term = directive<Found>({
	name: 'term',
	level: 'inline',
	words: 'A word from the lab’s glossary, explained at the end of the article.',
	attributes: [
		{
			name: 'name',
			required: true,
			words: 'which term',
			values: (data) => (data.glossary ?? []).map(({ slug }) => slug)
		},
		attribute.text('text', 'the word as this sentence has it; the term itself if left out')
	],
	resolve(call, data) {
		const terms = data.glossary ?? [];
		if (terms.length === 0)
			return missing('The glossary has no terms yet. Add one at the desk, under Glossary.');
		const name = call.attributes.name ?? '';
		const one = termOf(terms, name);
		return one
			? found(one)
			: unknownName(
					`The glossary has no term called “${name}”.`,
					name,
					terms.map(({ slug }) => slug)
				);
	},
	render({ term: { slug, explanation }, called }, { call, termsSoFar }) {
		const text = call.attributes.text ?? called;
		const first = !termsSoFar.has(slug);
		const link = element(
			'a',
			{ class: 'term', id: first ? `tr-${slug}` : undefined, href: `#term-${slug}`, title: explanation },
			escapeHtml(text)
		);
		return { html: first ? element('dfn', {}, link) : link, plain: text, terms: [slug] };
	}
});
