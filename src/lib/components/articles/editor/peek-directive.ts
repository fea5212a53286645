import type { Rendered } from '../../../domain/articles/render-article';

/** What a directive would print, small enough to stand beside it. */
export type Peek =
	| { kind: 'value'; printed: string; behind: string }
	| { kind: 'plate'; title: string; sub: string; svg: string }
	| { kind: 'block'; text: string }
	| { kind: 'fault'; message: string; nearest: string[] };

/**
 * What stands on the page for one directive of the source.
 * @param html its markup, sanitised
 */
export function peekOf(rendered: Rendered, html: string): Peek | null {
	const [error] = rendered.errors;
	if (error) return { kind: 'fault', message: error.message, nearest: error.nearest };
	const template = document.createElement('template');
	template.innerHTML = html;
	const page = template.content;
	const [bound] = rendered.bound;
	if (bound)
		return {
			kind: 'value',
			printed: bound.printed,
			behind: page.querySelector('[title]')?.getAttribute('title') ?? ''
		};
	const [plate] = rendered.plates;
	if (plate)
		return {
			kind: 'plate',
			title: plate.spec.title,
			sub: plate.spec.sub,
			svg: page.querySelector('.plate-drawing')?.innerHTML ?? ''
		};
	const text = rendered.plain.trim();
	return text === '' ? null : { kind: 'block', text: text.length > 320 ? `${text.slice(0, 320)} …` : text };
}

/** The same in a sentence, for the line under the source. */
export function peekInWords(peek: Peek): string {
	switch (peek.kind) {
		case 'value':
			return `${peek.printed} · ${peek.behind}`;
		case 'plate':
			return `Plate: ${peek.title}. ${peek.sub}`;
		case 'block':
			return peek.text.replace(/\s+/g, ' ').slice(0, 140);
		case 'fault':
			return peek.message + (peek.nearest.length > 0 ? ` Near: ${peek.nearest.join(', ')}.` : '');
	}
}
