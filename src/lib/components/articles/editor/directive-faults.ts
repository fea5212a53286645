import { forEachDiagnostic, linter, setDiagnostics, type Diagnostic } from '@codemirror/lint';
import type { EditorState, Extension, TransactionSpec } from '@codemirror/state';
import type { EditorView } from '@codemirror/view';
import type { Fault, Mend } from '../../../domain/articles/mends';

/** A change found in a text that may have moved since: counted from where its fault is now. */
function apply(view: EditorView, mend: Mend, moved: number): void {
	const from = mend.from + moved;
	view.dispatch({
		changes: { from, to: mend.to + moved, insert: mend.insert },
		selection: { anchor: from + mend.insert.length },
		userEvent: 'input.complete'
	});
	view.focus();
}

const diagnosticOf = (fault: Fault, length: number): Diagnostic => ({
	from: Math.min(fault.from, length),
	to: Math.min(fault.to, length),
	severity: 'error',
	message: fault.message,
	actions: fault.mends.map((mend) => ({
		name: mend.words,
		apply: (view, from) => apply(view, mend, from - fault.from)
	}))
});

/** Underlines what the page cannot print, each with the names that are near. */
export const withFaults = (state: EditorState, faults: readonly Fault[]): TransactionSpec =>
	setDiagnostics(
		state,
		faults.map((fault) => diagnosticOf(fault, state.doc.length))
	);

/** Mends the fault at the cursor, or the next one behind it, with its nearest name. */
export function mendHere(view: EditorView): boolean {
	const { from, to } = view.state.selection.main;
	const found: { from: number; to: number; one: Diagnostic }[] = [];
	forEachDiagnostic(view.state, (one, start, end) => found.push({ one, from: start, to: end }));
	const mendable = found.filter(({ one }) => (one.actions?.length ?? 0) > 0);
	const here = mendable.find((fault) => fault.to >= from && fault.from <= to);
	const chosen = here ?? mendable.find((fault) => fault.from > to) ?? mendable[0];
	chosen?.one.actions?.[0]?.apply(view, chosen.from, chosen.to);
	return true;
}

/** Faults come from the page, not from a reading of the source; this shows them as one hovers over them. */
export const faultMarks: Extension = linter(null);
