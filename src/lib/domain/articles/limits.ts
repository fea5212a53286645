/** Longest source taken, in UTF-16 units: some sixty thousand words. */
export const maxSourceLength = 400_000;
/** Longest run of lines without an empty one between them. */
const maxBlockLength = 40_000;
/** Deepest nesting of quotes and lists. */
const maxNesting = 40;

/** How deep the quote marks and list marks at the start of a line go, the indent before them counted in twos. */
function nestingOf(line: string): number {
	const start = /^(?:[ \t]*(?:>|[-*+](?=[ \t])|\d{1,9}[.)](?=[ \t])))+/.exec(line)?.[0];
	if (start === undefined) return 0;
	const indent = /^[ \t]*/.exec(start)?.[0].replace(/\t/g, '    ').length ?? 0;
	return Math.floor(indent / 2) + (start.match(/>|[-*+]|\d+[.)]/g)?.length ?? 0);
}

/**
 * Why a source cannot be set, in words; null where it can. Looked at before parsing, because the parser
 * recurses once for each level of nesting and looks back over a whole block.
 */
export function refusalOf(source: string): { message: string; line: number } | null {
	if (source.length > maxSourceLength) {
		return {
			line: 1,
			message: `This text has ${source.length} characters; the longest that can be set is ${maxSourceLength}. Part it into several articles. What you typed is kept.`
		};
	}
	let block = 0;
	let number = 0;
	for (const line of source.split(/\r\n|\r|\n/)) {
		number += 1;
		if (nestingOf(line) > maxNesting) {
			return {
				line: number,
				message: `Quotes or lists are nested deeper than ${maxNesting} levels. Take some levels out. What you typed is kept.`
			};
		}
		block = line.trim() === '' ? 0 : block + line.length + 1;
		if (block > maxBlockLength) {
			return {
				line: number,
				message: `One block without an empty line has more than ${maxBlockLength} characters. Part it with empty lines. What you typed is kept.`
			};
		}
	}
	return null;
}
