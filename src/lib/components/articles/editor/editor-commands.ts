import { startCompletion } from '@codemirror/autocomplete';
import { redo, undo } from '@codemirror/commands';
import { nextDiagnostic } from '@codemirror/lint';
import { openSearchPanel } from '@codemirror/search';
import { EditorSelection } from '@codemirror/state';
import type { EditorView } from '@codemirror/view';
import { mendHere } from './directive-faults';
import type { Keyed } from './keys';

/** What commands ask of the screen around the source. */
export interface Desk {
	save: () => void;
	insert: () => void;
	/** Asks for pictures to put in. */
	picture: () => void;
	outline: () => void;
	/** Leaves everything but one side away; or brings it back. */
	alone: (side: 'source' | 'page') => void;
	keys: () => void;
	showOnPage: () => void;
}

export interface EditorCommand extends Keyed {
	/** Works wherever the focus is, the source or not. */
	everywhere?: true;
	/** Whether it did something; a command without a source to work on does nothing. */
	run: (desk: Desk, view: EditorView) => boolean;
}

const done = (act: () => void): boolean => {
	act();
	return true;
};

/** Puts a mark on both sides of what is selected, or takes it away where it stands already. */
const marked = (mark: string) => (_desk: Desk, view: EditorView) => {
	const { state } = view;
	const length = mark.length;
	const changed = state.changeByRange(({ from, to }) => {
		const around = state.sliceDoc(from - length, from) === mark && state.sliceDoc(to, to + length) === mark;
		return around
			? {
					changes: [
						{ from: from - length, to: from },
						{ from: to, to: to + length }
					],
					range: EditorSelection.range(from - length, to - length)
				}
			: {
					changes: [
						{ from, insert: mark },
						{ from: to, insert: mark }
					],
					range: EditorSelection.range(from + length, to + length)
				};
	});
	view.dispatch(state.update(changed, { userEvent: 'input', scrollIntoView: true }));
	return true;
};

/** A link around what is selected, the cursor where its address goes. */
function linked(_desk: Desk, view: EditorView): boolean {
	const { from, to } = view.state.selection.main;
	const text = view.state.sliceDoc(from, to);
	view.dispatch({
		changes: { from, to, insert: `[${text}]()` },
		selection: { anchor: from + (text === '' ? 1 : text.length + 3) },
		userEvent: 'input'
	});
	return true;
}

/** Every command of the editor with its first key, in the order they are listed. */
export const editorCommands: readonly EditorCommand[] = [
	{ id: 'save', words: 'Save now', keys: 'Mod-s', everywhere: true, run: (desk) => done(desk.save) },
	{
		id: 'insert',
		words: 'Insert from the bench',
		keys: 'Mod-j',
		everywhere: true,
		run: (desk) => done(desk.insert)
	},
	{
		id: 'picture',
		words: 'Add pictures',
		keys: 'Mod-Shift-e',
		everywhere: true,
		run: (desk) => done(desk.picture)
	},
	{
		id: 'complete',
		words: 'Complete what is typed',
		keys: 'Ctrl-Space',
		run: (_, view) => startCompletion(view)
	},
	{
		id: 'next-fault',
		words: 'Go to the next thing to mend',
		keys: 'F8',
		run: (_, view) => nextDiagnostic(view)
	},
	{ id: 'mend', words: 'Mend it with the nearest name', keys: 'Mod-.', run: (_, view) => mendHere(view) },
	{ id: 'find', words: 'Find and replace', keys: 'Mod-f', run: (_, view) => openSearchPanel(view) },
	{ id: 'bold', words: 'Bold', keys: 'Mod-b', run: marked('**') },
	{ id: 'italic', words: 'Italic', keys: 'Mod-i', run: marked('*') },
	{ id: 'link', words: 'Link', keys: 'Mod-Shift-l', run: linked },
	{ id: 'undo', words: 'Undo', keys: 'Mod-z', run: (_, view) => undo(view) },
	{ id: 'redo', words: 'Redo', keys: 'Mod-Shift-z', run: (_, view) => redo(view) },
	{
		id: 'outline',
		words: 'Outline',
		keys: 'Mod-Shift-o',
		everywhere: true,
		run: (desk) => done(desk.outline)
	},
	{
		id: 'show',
		words: 'Show this place on the page',
		keys: 'Alt-Enter',
		run: (desk) => done(desk.showOnPage)
	},
	{
		id: 'source-alone',
		words: 'Source alone',
		keys: 'Alt-Shift-s',
		everywhere: true,
		run: (desk) => done(() => desk.alone('source'))
	},
	{
		id: 'page-alone',
		words: 'Page alone',
		keys: 'Alt-Shift-p',
		everywhere: true,
		run: (desk) => done(() => desk.alone('page'))
	},
	{ id: 'keys', words: 'Keys', keys: 'Mod-/', everywhere: true, run: (desk) => done(desk.keys) }
];
