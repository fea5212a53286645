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
	// The library's underline is a picture in a data: address; a text decoration follows our colours.
	'.cm-lintRange-error': {
		backgroundImage: 'none',
		textDecoration: 'underline wavy var(--color-red)',
		textUnderlineOffset: '4px'
	},
	'.cm-lintRange-active': { backgroundColor: 'color-mix(in srgb, var(--color-red) 14%, transparent)' },
	'.cm-lintPoint': { display: 'none' },
	'.cm-diagnostic': {
		maxWidth: '34rem',
		padding: '8px 12px',
		fontFamily: 'var(--font-sans)',
		fontSize: '13.5px',
		lineHeight: '1.45'
	},
	'.cm-diagnostic-error': { borderLeft: '3px solid var(--color-red)' },
	'.cm-diagnosticAction': {
		margin: '6px 10px 0 0',
		padding: '2px 8px',
		background: 'none',
		border: '1px solid var(--color-blue)',
		borderRadius: '3px',
		color: 'var(--color-blue)'
	},
	'.cm-peek': {
		maxWidth: '26rem',
		padding: '8px 12px',
		fontFamily: 'var(--font-sans)',
		fontSize: '13.5px',
		lineHeight: '1.45'
	},
	'.cm-peek p': { margin: '0' },
	'.cm-peek-value': { fontFamily: 'var(--font-serif)', fontSize: '20px', fontWeight: '600' },
	'.cm-peek-title': { fontFamily: 'var(--font-serif)', fontWeight: '600' },
	'.cm-peek-sub': { color: 'var(--color-graphite)' },
	'.cm-peek-plate svg': { display: 'block', width: '24rem', height: 'auto', marginTop: '6px' },
	// Of the two drawings of a plate the wide one.
	'.cm-peek-plate .plate-narrow': { display: 'none' },
	'.cm-awaited': {
		padding: '1px 8px',
		borderBottom: '1px dashed var(--color-edge)',
		fontFamily: 'var(--font-sans)',
		color: 'var(--color-graphite)'
	},
	'.cm-panels': {
		background: 'var(--color-sheet)',
		color: 'var(--color-ink)',
		fontFamily: 'var(--font-sans)',
		fontSize: '13.5px'
	},
	'.cm-panels.cm-panels-top': { borderBottom: '1px solid var(--color-rule)' },
	'.cm-panels.cm-panels-bottom': { borderTop: '1px solid var(--color-rule)' },
	'.cm-panel.cm-search': { padding: '8px 40px 8px 6px', lineHeight: '1.9' },
	'.cm-panel.cm-search label': { fontSize: 'inherit', marginRight: '10px' },
	'.cm-panel.cm-search [name=close]': {
		top: '6px',
		right: '8px',
		padding: '0 6px',
		fontSize: '18px',
		color: 'var(--color-ink)'
	},
	'.cm-textfield': {
		background: 'var(--color-paper)',
		border: '1px solid var(--color-edge)',
		borderRadius: '3px',
		color: 'var(--color-ink)',
		fontFamily: 'inherit',
		fontSize: 'inherit',
		padding: '2px 6px'
	},
	'.cm-button': {
		background: 'none',
		border: '1px solid var(--color-blue)',
		borderRadius: '3px',
		color: 'var(--color-blue)',
		fontFamily: 'inherit',
		fontSize: 'inherit',
		padding: '1px 8px'
	},
	'.cm-textfield:focus-visible, .cm-button:focus-visible, .cm-panel input:focus-visible, .cm-panel button:focus-visible, .cm-diagnosticAction:focus-visible':
		{ outline: '2px solid var(--color-blue)', outlineOffset: '1px' },
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

/** Colours directives. */
const decorator = new MatchDecorator({
	regexp: written,
	decorate(add, from, to, match, view) {
		const before = view.state.sliceDoc(Math.max(0, from - 1), from);
		// A colon in a word or a time is no directive, nor one without braces in a sentence.
		if (/[\w:]/.test(before) || !(match[0].startsWith('::') || match[0].includes('{'))) return;
		add(from, to, Decoration.mark({ class: 'cm-directive' }));
	}
});

const directiveMarks = ViewPlugin.define<{ decorations: DecorationSet; update(update: ViewUpdate): void }>(
	(view) => ({
		decorations: decorator.createDeco(view),
		update(update) {
			this.decorations = decorator.updateDeco(update, this.decorations);
		}
	}),
	{ decorations: (plugin) => plugin.decorations }
);

/** Everything about how the editor looks. */
export const editorLook = [look, syntaxHighlighting(marksOfText), directiveMarks];
