import { diffLines, diffWordsWithSpace, type Change } from 'diff';

/** A piece of the difference between two texts. */
export interface Piece {
	kind: 'same' | 'added' | 'removed';
	text: string;
}

/** A text as the difference shows it: pieces, and where long unchanged parts were left out. */
export type Shown = Piece | { kind: 'skipped'; lines: number };

/** Past this, comparing word by word would hold the page up; lines are compared instead. */
const timeoutMs = 1500;

const pieceOf = ({ added, removed, value }: Change): Piece => ({
	kind: added ? 'added' : removed ? 'removed' : 'same',
	text: value
});

/** The difference of two texts word by word (line by line for texts too far apart to compare in time), in reading order. */
export function difference(before: string, after: string): Piece[] {
	const words = diffWordsWithSpace(before, after, { timeout: timeoutMs }) as Change[] | undefined;
	return (words ?? diffLines(before, after)).map(pieceOf);
}

/** How many words were added and taken away. */
export function wordsChanged(pieces: Piece[]): { added: number; removed: number } {
	const count = (kind: Piece['kind']) =>
		pieces
			.filter((piece) => piece.kind === kind)
			.reduce((sum, piece) => sum + (piece.text.match(/\S+/g)?.length ?? 0), 0);
	return { added: count('added'), removed: count('removed') };
}

/**
 * Leaves out the middle of long unchanged parts, keeping some lines on each side of a change.
 * @example around([{ kind: 'same', text: longText }, change], 2)
 */
export function around(pieces: Piece[], context = 2): Shown[] {
	return pieces.flatMap((piece, index): Shown[] => {
		if (piece.kind !== 'same') return [piece];
		const lines = piece.text.split('\n');
		const head = index === 0 ? 0 : context;
		const tail = index === pieces.length - 1 ? 0 : context;
		if (lines.length <= head + tail + 3) return [piece];
		const first = lines.slice(0, head).join('\n');
		const last = lines.slice(lines.length - tail).join('\n');
		return [
			...(head > 0 ? [{ kind: 'same' as const, text: `${first}\n` }] : []),
			{ kind: 'skipped' as const, lines: lines.length - head - tail },
			...(tail > 0 ? [{ kind: 'same' as const, text: last }] : [])
		];
	});
}
