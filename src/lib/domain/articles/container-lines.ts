/** A container runs this many characters at most, from its opening to its closing line. */
const longestContainer = 8000;
/** How many containers stand in one another at most. */
const deepest = 3;

const opening = /^:::[a-z][\w-]*(?:\{[^{}]*\})?[ \t]*$/i;
const closing = /^:::[ \t]*$/;
const fence = /^ {0,3}(`{3,}|~{3,})/;

const unclosed = `This is not closed. End it with ::: on a line of its own, within ${longestContainer} characters.`;
const tooDeep = `This is not closed, or holds containers deeper than ${deepest} levels. Each ends with ::: on a line of its own.`;

/** The kind of fence a line opens, or closes where one is open already; else the fence as it was. */
function fenceAfter(line: string, open: string | null): string | null {
	const mark = fence.exec(line)?.[1];
	if (mark === undefined) return open;
	if (open === null) return mark;
	return mark[0] === open[0] && mark.length >= open.length && line.trim() === mark ? null : open;
}

/**
 * What stands between a container's opening line and the closing line that belongs to it, where the text after it
 * goes on, or why there is no such line. Containers inside are counted, code is passed over. It reads no further than
 * the caps allow, and stops at the fourth level: thousands of unclosed ones cost no more than their own lines.
 * @param from where the opening line ends, its line break included
 */
export function insideOf(source: string, from: number): { text: string; end: number } | { fault: string } {
	const last = Math.min(source.length, longestContainer);
	let depth = 1;
	let open: string | null = null;
	for (let at = from; at < last;) {
		const found = source.indexOf('\n', at);
		const stop = found < 0 ? source.length : found;
		const line = source.slice(at, Math.min(stop, last));
		const wasCode = open !== null;
		open = fenceAfter(line, open);
		if (!wasCode && open === null && line.startsWith(':::')) {
			if (closing.test(line)) depth -= 1;
			else if (opening.test(line)) depth += 1;
			if (depth > deepest) return { fault: tooDeep };
			if (depth === 0) {
				// Empty lines behind it belong to nothing.
				const after = /\n*/y;
				after.lastIndex = stop;
				return { text: source.slice(from, at), end: stop + (after.exec(source)?.[0].length ?? 0) };
			}
		}
		at = stop + 1;
	}
	return { fault: unclosed };
}
