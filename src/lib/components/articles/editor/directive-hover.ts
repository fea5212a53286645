import type { Extension } from '@codemirror/state';
import { hoverTooltip, type EditorView } from '@codemirror/view';
import { directiveAt, type WrittenDirective } from '../../../domain/articles/written-directives';
import type { Peek } from './peek-directive';

/** Directives are looked for this far around a place; longer ones are none. */
const reach = 800;

/** The directive at a place of the text, with its ends in the whole text. */
export function directiveNear(view: EditorView, at: number): (WrittenDirective & { source: string }) | null {
	const { doc } = view.state;
	// From the start of a line, so that what begins one is seen to.
	const start = doc.lineAt(Math.max(0, at - reach)).from;
	const text = doc.sliceString(start, Math.min(doc.length, at + reach));
	const found = directiveAt(text, at - start);
	if (!found) return null;
	return {
		...found,
		from: found.from + start,
		to: found.to + start,
		source: text.slice(found.from, found.to)
	};
}

function element(tag: string, name: string, text = ''): HTMLElement {
	const made = document.createElement(tag);
	made.className = name;
	made.textContent = text;
	return made;
}

function drawn(peek: Exclude<Peek, { kind: 'fault' }>): HTMLElement {
	const box = element('div', 'cm-peek');
	if (peek.kind === 'value') {
		box.append(element('p', 'cm-peek-value', peek.printed), element('p', 'cm-peek-sub', peek.behind));
	} else if (peek.kind === 'plate') {
		const picture = element('div', 'cm-peek-plate');
		// Sanitised with the page it is from.
		picture.innerHTML = peek.svg;
		box.append(element('p', 'cm-peek-title', peek.title), element('p', 'cm-peek-sub', peek.sub), picture);
	} else box.append(element('p', 'cm-peek-sub', peek.text));
	return box;
}

/** Shows what a directive prints when the pointer rests on it. Faults have a tooltip of their own, with their mends. */
export const directiveHover = (peek: (source: string) => Peek | null): Extension =>
	hoverTooltip((view, at) => {
		const one = directiveNear(view, at);
		const shown = one && peek(one.source);
		if (!one || !shown || shown.kind === 'fault') return null;
		return { pos: one.from, end: one.to, above: true, create: () => ({ dom: drawn(shown) }) };
	});
