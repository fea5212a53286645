import { HighlightStyle, syntaxHighlighting } from '@codemirror/language';
import {
	Decoration,
	EditorView,
	MatchDecorator,
	ViewPlugin,
	type DecorationSet,
	type ViewUpdate
} from '@codemirror/view';
import { tags } from '@lezer/highlight';

/** The editor in the publication's own colours: custom properties reach into the shadow root. */
const look = EditorView.theme({
	'&': { height: '100%', color: 'var(--color-ink)', backgroundColor: 'transparent', fontSize: '13.5px' },
	'&.cm-focused': { outline: 'none' },
	'.cm-scroller': { fontFamily: 'var(--font-mono)', lineHeight: '1.9', overflow: 'auto' },
	'.cm-content': { padding: '4px 0 45vh', caretColor: 'var(--color-ink)' },
	'.cm-line': { padding: '0 12px 0 6px' },
	'.cm-gutters': {
		backgroundColor: 'transparent',
		color: 'var(--color-graphite)',
		border: 'none',
		fontSize: '12px'
	},
	'.cm-lineNumbers .cm-gutterElement': { padding: '0 10px 0 0', minWidth: '30px' },
	'.cm-activeLine': { backgroundColor: 'color-mix(in srgb, var(--color-blue-tint) 65%, transparent)' },
	'.cm-activeLineGutter': { backgroundColor: 'transparent', color: 'var(--color-ink)' },
	'.cm-cursor': { borderLeftColor: 'var(--color-ink)', borderLeftWidth: '2px' },
	'&.cm-focused > .cm-scroller > .cm-selectionLayer .cm-selectionBackground, .cm-selectionBackground': {
		background: 'color-mix(in srgb, var(--color-blue) 22%, transparent)'
	},
	'.cm-directive': { color: 'var(--color-blue)', fontWeight: '500' },
	'.cm-directive-wrong': {
		textDecoration: 'underline wavy var(--color-red)',
		textUnderlineOffset: '4px'
	},
	'.cm-tooltip': {
		background: 'var(--color-sheet)',
		border: '1px solid var(--color-ink)',
		color: 'var(--color-ink)'
	},
	'.cm-tooltip.cm-tooltip-autocomplete > ul': {
		fontFamily: 'var(--font-mono)',
		fontSize: '13px',
		maxWidth: '34rem'
	},
	'.cm-tooltip.cm-tooltip-autocomplete > ul > li': { padding: '3px 10px' },
	'.cm-tooltip.cm-tooltip-autocomplete > ul > li[aria-selected]': {
		background: 'var(--color-blue-tint)',
		color: 'var(--color-blue)'
	},
	'.cm-completionDetail': {
		fontFamily: 'var(--font-sans)',
		fontStyle: 'normal',
		color: 'var(--color-graphite)',
		marginLeft: '12px'
	},
	'.cm-completionIcon': { display: 'none' },
	'.cm-panels': {
		background: 'var(--color-sheet)',
		color: 'var(--color-ink)',
		fontFamily: 'var(--font-sans)'
	},
	'.cm-panels.cm-panels-bottom': { borderTop: '1px solid var(--color-rule)' },
	'.cm-textfield': {
		background: 'var(--color-paper)',
		border: '1px solid var(--color-edge)',
		borderRadius: '3px'
	},
	'.cm-button': {
		background: 'none',
		border: '1px solid var(--color-blue)',
		borderRadius: '3px',
		color: 'var(--color-blue)'
	},
	'.cm-searchMatch': { backgroundColor: 'var(--color-brass-tint)' },
	'.cm-searchMatch-selected': { outline: '1px solid var(--color-brass)' },
	'.cm-matchingBracket, &.cm-focused .cm-matchingBracket': { backgroundColor: 'var(--color-blue-tint)' }
});

const marksOfText = HighlightStyle.define([
	{ tag: tags.heading, fontWeight: '650' },
	{ tag: tags.strong, fontWeight: '650' },
	{ tag: tags.emphasis, fontStyle: 'italic' },
	{ tag: [tags.link, tags.url], color: 'var(--color-blue)' },
	{ tag: [tags.processingInstruction, tags.meta, tags.quote], color: 'var(--color-graphite)' },
	{ tag: tags.monospace, color: 'var(--color-graphite)' }
]);

const written = /:{1,3}[a-z][\w-]*(?:\{[^{}\n]*\}?)?/gi;

/** Colours directives, and underlines those on lines where the page has an error. */
function directiveMarks(wrongLines: () => ReadonlySet<number>) {
	const decorator = new MatchDecorator({
		regexp: written,
		decorate(add, from, to, match, view) {
			const before = view.state.sliceDoc(Math.max(0, from - 1), from);
			// A colon in a word or a time is no directive, nor one without braces in a sentence.
			if (/[\w:]/.test(before) || !(match[0].startsWith('::') || match[0].includes('{'))) return;
			const wrong = wrongLines().has(view.state.doc.lineAt(from).number);
			add(from, to, Decoration.mark({ class: wrong ? 'cm-directive cm-directive-wrong' : 'cm-directive' }));
		}
	});
	return ViewPlugin.define<{ decorations: DecorationSet; update(update: ViewUpdate): void }>(
		(view) => ({
			decorations: decorator.createDeco(view),
			update(update) {
				const marked = update.transactions.some((one) => one.isUserEvent('calipress.marks'));
				this.decorations = marked
					? decorator.createDeco(update.view)
					: decorator.updateDeco(update, this.decorations);
			}
		}),
		{ decorations: (plugin) => plugin.decorations }
	);
}

/** Everything about how the editor looks. */
export const editorLook = (wrongLines: () => ReadonlySet<number>) => [
	look,
	syntaxHighlighting(marksOfText),
	directiveMarks(wrongLines)
];
