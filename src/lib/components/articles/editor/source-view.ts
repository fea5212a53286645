import { autocompletion } from '@codemirror/autocomplete';
import { markdown, markdownLanguage } from '@codemirror/lang-markdown';
import { EditorState, Transaction } from '@codemirror/state';
import { EditorView, keymap } from '@codemirror/view';
import { basicSetup } from 'codemirror';
import type { ArticleData } from '../../../domain/articles/data';
import { claimMarks, claimsView, type ClaimsView } from './claim-marks';
import { directiveCompletion } from './directive-completion';
import { editorLook } from './editor-look';

export interface SourceViewOptions {
	source: string;
	/** What the completions are taken from; asked anew each time. */
	data: () => ArticleData;
	onchange: (source: string) => void;
	onsave: () => void;
	/** The line the cursor went to, from 1. */
	online: (line: number) => void;
	/** What stands where has changed: notes beside the text move. */
	onlayout: () => void;
	label: string;
}

/** What the screen may ask of the editor. */
export interface SourceView {
	/** Puts text at the cursor, over what is selected, and goes on after it; a block gets lines of its own. */
	insert: (text: string, block: boolean) => void;
	/** Sets the whole text, such as after a conflict; one step of undo. */
	replace: (source: string) => void;
	goToLine: (line: number) => void;
	setWrongLines: (lines: ReadonlySet<number>) => void;
	claims: ClaimsView;
	focus: () => void;
	destroy: () => void;
}

/** What stands around the cursor so that a directive of its own line has one. */
function asBlock(state: EditorState, text: string): string {
	const { from, to } = state.selection.main;
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

/**
 * The source editor in a shadow root of `host`. There CodeMirror uses constructed style sheets, which a strict
 * Content-Security-Policy lets through, where in the document it would insert a style element.
 */
export function sourceView(host: HTMLElement, options: SourceViewOptions): SourceView {
	const root = host.shadowRoot ?? host.attachShadow({ mode: 'open', delegatesFocus: true });
	let wrong: ReadonlySet<number> = new Set();
	let line = 0;
	const view = new EditorView({
		root,
		parent: root as unknown as Element,
		state: EditorState.create({
			doc: options.source,
			extensions: [
				keymap.of([{ key: 'Mod-s', preventDefault: true, run: () => (options.onsave(), true) }]),
				basicSetup,
				markdown({ base: markdownLanguage, addKeymap: true }),
				autocompletion({ override: [directiveCompletion(options.data)], icons: false }),
				EditorView.lineWrapping,
				EditorView.contentAttributes.of({
					'aria-label': options.label,
					spellcheck: 'true',
					tabindex: '0'
				}),
				editorLook(() => wrong),
				claimMarks(() => options.onlayout()),
				EditorView.updateListener.of((update) => {
					if (update.docChanged) options.onchange(update.state.doc.toString());
					if (!update.selectionSet && !update.docChanged) return;
					const at = update.state.doc.lineAt(update.state.selection.main.head).number;
					if (at !== line) options.online((line = at));
				})
			]
		})
	});
	return {
		insert(text, block) {
			const written = block ? asBlock(view.state, text) : text;
			const { from, to } = view.state.selection.main;
			view.dispatch({
				changes: { from, to, insert: written },
				selection: { anchor: from + written.length },
				scrollIntoView: true,
				userEvent: 'input.paste'
			});
			view.focus();
		},
		replace: (source) =>
			view.dispatch({
				changes: { from: 0, to: view.state.doc.length, insert: source },
				selection: { anchor: Math.min(view.state.selection.main.anchor, source.length) }
			}),
		goToLine(number) {
			const target = view.state.doc.line(Math.min(Math.max(1, number), view.state.doc.lines));
			view.dispatch({
				selection: { anchor: target.from },
				effects: EditorView.scrollIntoView(target.from, { y: 'center' })
			});
			view.focus();
		},
		setWrongLines(lines) {
			if (lines.size === wrong.size && [...lines].every((one) => wrong.has(one))) return;
			wrong = lines;
			view.dispatch({ annotations: Transaction.userEvent.of('calipress.marks') });
		},
		claims: claimsView(view),
		focus: () => view.focus(),
		destroy: () => view.destroy()
	};
}
