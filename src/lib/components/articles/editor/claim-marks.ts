import { StateEffect, StateField, type Extension, type Range } from '@codemirror/state';
import { Decoration, EditorView, hoverTooltip, type DecorationSet } from '@codemirror/view';
import { stateWords, type Binding, type Claim } from '../../../domain/articles/claims/claims';

/** A claim where it stands now, whatever was typed since it was found. */
export interface PlacedClaim {
	claim: Claim;
	from: number;
	to: number;
	/** Pixels from the top of the whole text. */
	top: number;
}

/** What the screen may ask of an editor about its claims. */
export interface ClaimsView {
	/** Marks claims of the text; those whose words have changed since are left out until they are found again. */
	set: (claims: readonly Claim[]) => void;
	placed: () => PlacedClaim[];
	scrollTop: () => number;
	goTo: (claim: Claim) => void;
	/** Writes a directive in the place of a claim; false where its words have changed. */
	bind: (claim: Claim, binding: Binding) => boolean;
	/** Writes a number as one from elsewhere, the cursor where its source is to be named. */
	setAside: (claim: Claim) => boolean;
}

const look = EditorView.theme({
	'.cm-claim': { textDecorationThickness: '2px', textUnderlineOffset: '5px', textDecorationSkipInk: 'none' },
	'.cm-claim-agrees': { textDecoration: 'underline solid 2px var(--color-verdigris)' },
	'.cm-claim-contradicts': {
		textDecoration: 'underline solid 2px var(--color-red)',
		backgroundColor: 'var(--color-red-tint)'
	},
	'.cm-claim-more-than-data': { textDecoration: 'underline dashed 2px var(--color-red)' },
	'.cm-claim-not-backed': { textDecoration: 'underline dotted 2px var(--color-brass)' },
	'.cm-claim-words': {
		maxWidth: '24rem',
		padding: '6px 10px',
		fontFamily: 'var(--font-sans)',
		fontSize: '13px'
	},
	'.cm-claim-words strong': { display: 'block' }
});

const given = StateEffect.define<readonly Claim[]>();

const marked = (claim: Claim): Range<Decoration> =>
	Decoration.mark({ class: `cm-claim cm-claim-${claim.state}`, claim }).range(claim.from, claim.to);

/** The marks; each carries its claim, and moves with the text around it. */
const marks = StateField.define<DecorationSet>({
	create: () => Decoration.none,
	update(before, transaction) {
		let now = before.map(transaction.changes);
		for (const effect of transaction.effects)
			if (effect.is(given)) {
				const { doc } = transaction.state;
				const standing = effect.value.filter(
					({ from, to, text }) => to <= doc.length && from < to && doc.sliceString(from, to) === text
				);
				now = Decoration.set(standing.map(marked), true);
			}
		return now;
	},
	provide: (field) => EditorView.decorations.from(field)
});

const claimOf = (mark: Decoration): Claim => (mark.spec as { claim: Claim }).claim;

/** Says in words what the underline says. */
const words = hoverTooltip((view, pos, side) => {
	let found: { claim: Claim; from: number; to: number } | null = null;
	view.state.field(marks).between(pos, pos, (from, to, mark) => {
		if ((from < pos || side > 0) && (to > pos || side < 0)) found = { claim: claimOf(mark), from, to };
	});
	const hit = found as { claim: Claim; from: number; to: number } | null;
	if (!hit) return null;
	return {
		pos: hit.from,
		end: hit.to,
		above: true,
		create: () => {
			const dom = document.createElement('div');
			dom.className = 'cm-claim-words';
			const state = dom.appendChild(document.createElement('strong'));
			state.textContent = stateWords[hit.claim.state];
			dom.append([hit.claim.stored, hit.claim.why].filter(Boolean).join(' '));
			return { dom };
		}
	};
});

/** Where a position stands, in pixels from the top of the text: exact where it is drawn, else by its line. */
function topOf(view: EditorView, pos: number): number {
	const shift = view.scrollDOM.scrollTop - view.scrollDOM.getBoundingClientRect().top;
	const { from, to } = view.viewport;
	const exact = pos >= from && pos <= to ? view.coordsAtPos(pos) : null;
	if (exact) return exact.top + shift;
	const line = view.lineBlockAt(pos);
	const share = line.length === 0 ? 0 : (pos - line.from) / line.length;
	return view.documentTop + line.top + share * line.height + shift;
}

/** Underlines claims in the source. @param onlayout the text, its size or what is in view has changed */
export const claimMarks = (onlayout: () => void): Extension => [
	look,
	marks,
	words,
	EditorView.updateListener.of((update) => {
		const set = update.transactions.some((one) => one.effects.some((effect) => effect.is(given)));
		if (set || update.docChanged || update.geometryChanged || update.viewportChanged) onlayout();
	}),
	EditorView.domEventHandlers({ scroll: () => onlayout() })
];

/** The claims of an editor that has the marks. */
export function claimsView(view: EditorView): ClaimsView {
	const spans = () => {
		const found: { claim: Claim; from: number; to: number }[] = [];
		view.state
			.field(marks)
			.between(
				0,
				view.state.doc.length,
				(from, to, mark) => void found.push({ claim: claimOf(mark), from, to })
			);
		return found;
	};
	const spanOf = (claim: Claim) => {
		const span = spans().find((one) => one.claim === claim);
		return span && view.state.sliceDoc(span.from, span.to) === claim.text ? span : null;
	};
	const write = (from: number, to: number, insert: string, cursor: number) => {
		view.dispatch({
			changes: { from, to, insert },
			selection: { anchor: from + cursor },
			scrollIntoView: true,
			userEvent: 'input.bind'
		});
		view.focus();
		return true;
	};
	return {
		set: (claims) => view.dispatch({ effects: given.of(claims) }),
		placed: () => spans().map((one) => ({ ...one, top: topOf(view, one.from) })),
		scrollTop: () => view.scrollDOM.scrollTop,
		goTo(claim) {
			const span = spanOf(claim);
			if (!span) return;
			view.dispatch({
				selection: { anchor: span.from, head: span.to },
				effects: EditorView.scrollIntoView(span.from, { y: 'center' })
			});
			view.focus();
		},
		bind(claim, { source }) {
			const span = spanOf(claim);
			if (!span) return false;
			const from = span.from + claim.bindFrom - claim.from;
			return write(from, span.to + claim.bindTo - claim.to, source, source.length);
		},
		setAside(claim) {
			const span = spanOf(claim);
			if (!span) return false;
			const head = `:source{text="${claim.text.replace(/["{}\s]+/g, ' ')}" from="`;
			return write(span.from, span.to, `${head}"}`, head.length);
		}
	};
}
