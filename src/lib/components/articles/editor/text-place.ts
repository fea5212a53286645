/** The text node and place in it under a point; browsers name this differently. */
function caretAt(x: number, y: number): { node: Node; offset: number } | null {
	if ('caretPositionFromPoint' in document) {
		const caret = document.caretPositionFromPoint(x, y);
		return caret && { node: caret.offsetNode, offset: caret.offset };
	}
	const range = (document as Document).caretRangeFromPoint(x, y);
	return range && { node: range.startContainer, offset: range.startOffset };
}

/** What an element shows, and how much of it stands before a point. */
export function textPlaceAt(element: Element, x: number, y: number): { text: string; at: number } {
	const text = element.textContent;
	const caret = caretAt(x, y);
	if (!caret || !element.contains(caret.node)) return { text, at: 0 };
	const range = document.createRange();
	range.setStart(element, 0);
	range.setEnd(caret.node, caret.offset);
	return { text, at: range.toString().length };
}
