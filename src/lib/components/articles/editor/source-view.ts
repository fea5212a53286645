import { acceptCompletion, autocompletion } from '@codemirror/autocomplete';
import { indentWithTab } from '@codemirror/commands';
import { markdown, markdownLanguage } from '@codemirror/lang-markdown';
import { search } from '@codemirror/search';
import { Compartment, EditorState, Prec, type Extension } from '@codemirror/state';
import { EditorView, keymap } from '@codemirror/view';
import { basicSetup } from 'codemirror';
import type { ArticleData } from '../../../domain/articles/data';
import type { Fault } from '../../../domain/articles/mends';
import { claimMarks, claimsView, type ClaimsView } from './claim-marks';
import { directiveCompletion } from './directive-completion';
import { faultMarks, withFaults } from './directive-faults';
import { directiveHover, directiveNear } from './directive-hover';
import { editorCommands, type Desk } from './editor-commands';
import { editorLook } from './editor-look';
import { editorWords } from './editor-words';
import { keyOf, type ChangedKeys } from './keys';
import { asBlock, pasting, type PastingOptions } from './pasting';
import type { Peek } from './peek-directive';

export interface SourceViewOptions extends PastingOptions {
	source: string;
	/** What the completions are taken from; asked anew each time. */
	data: () => ArticleData;
	desk: Desk;
	keys: ChangedKeys;
	onchange: (source: string) => void;
	/** Where the cursor went: the line, from 1, and the directive it is in. */
	onplace: (line: number, directive: string | null) => void;
	onscroll: () => void;
	/** What stands where has changed: notes beside the text move. */
	onlayout: () => void;
	/** What a directive would print. */
	peek: (source: string) => Peek | null;
	label: string;
}

/** What the screen may ask of the editor. */
export interface SourceView {
	/** Puts text at the cursor, over what is selected, and goes on after it; a block gets lines of its own. */
	insert: (text: string, block: boolean) => void;
	/** Sets the whole text, such as after a conflict; one step of undo. */
	replace: (source: string) => void;
	/** Brings a line, or a place in the text of its block, to the middle, the cursor on it. */
	goToLine: (line: number, column?: number) => void;
	setFaults: (faults: readonly Fault[]) => void;
	setKeys: (changed: ChangedKeys) => void;
	run: (id: string) => boolean;
	claims: ClaimsView;
	focus: () => void;
	/** What scrolls, and how far down in it a line begins. */
	scroller: HTMLElement;
	topOf: (line: number) => number;
	/** For extensions that send effects of their own. */
	view: EditorView;
	destroy: () => void;
}

const keymapOf = (desk: Desk, changed: ChangedKeys): Extension =>
	keymap.of(
		editorCommands.map((command) => ({
			key: keyOf(command, changed),
			preventDefault: true,
			run: (view) => command.run(desk, view)
		}))
	);

/**
 * The source editor in a shadow root of `host`. There CodeMirror uses constructed style sheets, which a strict
 * Content-Security-Policy lets through, where in the document it would insert a style element.
 */
export function sourceView(host: HTMLElement, options: SourceViewOptions): SourceView {
	const root = host.shadowRoot ?? host.attachShadow({ mode: 'open', delegatesFocus: true });
	const keys = new Compartment();
	let line = 0;
	let inside: string | null = null;
	let marked = '[]';
	const view = new EditorView({
		root,
		parent: root as unknown as Element,
		state: EditorState.create({
			doc: options.source,
			extensions: [
				Prec.high(keys.of(keymapOf(options.desk, options.keys))),
				keymap.of([{ key: 'Tab', run: acceptCompletion }, indentWithTab]),
				basicSetup,
				markdown({ base: markdownLanguage, addKeymap: true }),
				autocompletion({ override: [directiveCompletion(options.data)], icons: false }),
				search({ top: true }),
				editorWords,
				faultMarks,
				directiveHover(options.peek),
				pasting(options),
				EditorView.lineWrapping,
				EditorView.contentAttributes.of({
					'aria-label': options.label,
					spellcheck: 'true',
					tabindex: '0'
				}),
				editorLook,
				claimMarks(() => options.onlayout()),
				EditorView.updateListener.of((update) => {
					if (update.docChanged) options.onchange(update.state.doc.toString());
					if (!update.selectionSet && !update.docChanged) return;
					const { head } = update.state.selection.main;
					const at = update.state.doc.lineAt(head).number;
					const directive = directiveNear(update.view, head)?.source ?? null;
					if (at !== line || directive !== inside) options.onplace((line = at), (inside = directive));
				})
			]
		})
	});
	view.scrollDOM.addEventListener('scroll', options.onscroll, { passive: true });
	const lineAt = (number: number) => view.state.doc.line(Math.min(Math.max(1, number), view.state.doc.lines));
	return {
		insert(text, block) {
			const { from, to } = view.state.selection.main;
			const written = block ? asBlock(view.state, text, from, to) : text;
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
		goToLine(number, column = 0) {
			const anchor = Math.min(lineAt(number).from + column, view.state.doc.length);
			view.dispatch({
				selection: { anchor },
				effects: EditorView.scrollIntoView(anchor, { y: 'center' })
			});
			view.focus();
		},
		setFaults(faults) {
			// Most keys mend nothing and break nothing.
			const now = JSON.stringify(faults);
			if (now === marked) return;
			marked = now;
			view.dispatch(withFaults(view.state, faults));
		},
		setKeys: (changed) => view.dispatch({ effects: keys.reconfigure(keymapOf(options.desk, changed)) }),
		run: (id) => editorCommands.find((command) => command.id === id)?.run(options.desk, view) ?? false,
		claims: claimsView(view),
		focus: () => view.focus(),
		scroller: view.scrollDOM,
		topOf: (number) => view.lineBlockAt(lineAt(number).from).top + view.documentPadding.top,
		view,
		destroy() {
			view.scrollDOM.removeEventListener('scroll', options.onscroll);
			view.destroy();
		}
	};
}
