import { StateEffect, StateField, type EditorState, type Extension } from '@codemirror/state';
import { Decoration, EditorView, WidgetType, type DecorationSet } from '@codemirror/view';
import { tableOfBlock } from '../../../domain/articles/pasted-table';
import type { Pasted, pastedHtml as PastedHtml } from './pasted-html';

/** Takes files in and gives the Markdown to put where they were dropped; null where nothing came of it. */
export type TakeFiles = (files: File[]) => Promise<string | null>;

export interface PastingOptions {
	/** Undefined where no pictures are taken. */
	onfiles: () => TakeFiles | undefined;
	/** Tells of what was left out of a paste. */
	onnote: (words: string) => void;
}

/** What stands around a place so that a block there has lines of its own. */
export function asBlock(state: EditorState, text: string, from: number, to: number): string {
	const before = state.sliceDoc(Math.max(0, from - 2), from);
	const after = state.sliceDoc(to, to + 2);
	const lead = from === 0 || before.endsWith('\n\n') ? '' : before.endsWith('\n') ? '\n' : '\n\n';
	const tail =
		after.startsWith('\n\n') || (after === '\n' && to + 1 === state.doc.length)
			? ''
			: after.startsWith('\n')
				? '\n'
				: '\n\n';
	return lead + text + tail;
}

class Awaited extends WidgetType {
	constructor(readonly words: string) {
		super();
	}
	override eq(other: Awaited) {
		return other.words === this.words;
	}
	override toDOM() {
		const mark = document.createElement('span');
		mark.className = 'cm-awaited';
		mark.setAttribute('role', 'status');
		mark.textContent = this.words;
		return mark;
	}
}

const begin = StateEffect.define<{ id: number; at: number; words: string }>({
	map: (value, changes) => ({ ...value, at: changes.mapPos(value.at) })
});
const end = StateEffect.define<number>();

/** The places that wait for files, which move along with the text. */
const awaited = StateField.define<DecorationSet>({
	create: () => Decoration.none,
	update(set, transaction) {
		let next = set.map(transaction.changes);
		for (const effect of transaction.effects) {
			if (effect.is(begin)) {
				const { id, at, words } = effect.value;
				const mark = Decoration.widget({ widget: new Awaited(words), id, side: 1 });
				next = next.update({ add: [mark.range(at)] });
			} else if (effect.is(end)) {
				next = next.update({ filter: (_from, _to, value) => value.spec.id !== effect.value });
			}
		}
		return next;
	},
	provide: (field) => EditorView.decorations.from(field)
});

function placeOf(view: EditorView, id: number): number | null {
	let at: number | null = null;
	view.state.field(awaited).between(0, view.state.doc.length, (from, _to, value) => {
		if (value.spec.id === id) at = from;
	});
	return at;
}

let count = 0;

/** Hands files over, shows in their place that they are on their way, and puts in what comes of them. */
export async function take(view: EditorView, files: File[], at: number, takeFiles: TakeFiles): Promise<void> {
	const id = (count += 1);
	const words =
		files.length === 1 ? `Adding ${files[0]?.name ?? 'a picture'} …` : `Adding ${files.length} pictures …`;
	view.dispatch({ effects: begin.of({ id, at, words }) });
	const markdown = await takeFiles(files).catch(() => null);
	const place = placeOf(view, id);
	if (place === null) return;
	const insert = markdown === null ? '' : asBlock(view.state, markdown, place, place);
	view.dispatch({ effects: end.of(id), changes: { from: place, insert }, userEvent: 'input.drop' });
}

const picturesOf = (data: DataTransfer | null): File[] =>
	[...(data?.files ?? [])].filter((file) => file.type.startsWith('image/'));

function put(view: EditorView, markdown: string, block: boolean): void {
	const { from, to } = view.state.selection.main;
	const insert = block ? asBlock(view.state, markdown, from, to) : markdown;
	view.dispatch({
		changes: { from, to, insert },
		selection: { anchor: from + insert.length },
		scrollIntoView: true,
		userEvent: 'input.paste'
	});
}

/** What the clipboard holds, as Markdown; null where its text is to be taken as it is. */
function readClipboard(clipboard: DataTransfer, pastedHtml: typeof PastedHtml | null): Pasted | null {
	const html = clipboard.getData('text/html');
	const pasted = html === '' ? null : pastedHtml?.(html);
	if (pasted) return pasted;
	const table = tableOfBlock(clipboard.getData('text/plain'));
	return table === null ? null : { markdown: table, pictures: 0 };
}

const leftOut = (pictures: number): string =>
	`${pictures === 1 ? 'A picture was' : `${pictures} pictures were`} left out of what was pasted. Drag the files in instead.`;

/**
 * What is pasted becomes Markdown, pictures that are pasted or dropped are handed over. Pasting as plain text, with
 * Shift, stays plain.
 */
export function pasting({ onfiles, onnote }: PastingOptions): Extension {
	let plain = false;
	// Fetched beside the page, and never on a server, which has no clipboard. Until it is here a paste is plain.
	let pastedHtml: typeof PastedHtml | null = null;
	void import('./pasted-html').then((loaded) => (pastedHtml = loaded.pastedHtml));
	return [
		awaited,
		EditorView.domEventHandlers({
			keydown(event) {
				plain = event.shiftKey && (event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'v';
				return false;
			},
			keyup() {
				plain = false;
				return false;
			},
			paste(event, view) {
				const clipboard = event.clipboardData;
				if (!clipboard || plain) return false;
				const takeFiles = onfiles();
				const pictures = picturesOf(clipboard);
				const hasText = clipboard.getData('text/plain') !== '';
				if (pictures.length > 0 && takeFiles && !hasText) {
					void take(view, pictures, view.state.selection.main.from, takeFiles);
					return true;
				}
				const pasted = readClipboard(clipboard, pastedHtml);
				if (!pasted || (pasted.markdown === '' && pasted.pictures === 0)) return false;
				const { markdown, pictures: left } = pasted;
				put(view, markdown, /\n|^(?:#|- |\d+\. |\|)/.test(markdown));
				// Said once the text is there, because a change of the text clears what was said.
				if (left > 0) onnote(leftOut(left));
				return true;
			},
			dragover(event) {
				if (event.dataTransfer?.types.includes('Files')) event.preventDefault();
				return false;
			},
			drop(event, view) {
				const files = event.dataTransfer?.files.length ?? 0;
				if (files === 0) return false;
				// A browser would leave the page for a file that is dropped on it.
				event.preventDefault();
				const pictures = picturesOf(event.dataTransfer);
				const takeFiles = onfiles();
				if (pictures.length === 0 || !takeFiles) {
					onnote('Only pictures can be dropped here.');
					return true;
				}
				const at = view.posAtCoords({ x: event.clientX, y: event.clientY }) ?? view.state.selection.main.head;
				void take(view, pictures, at, takeFiles);
				return true;
			}
		})
	];
}
