/** A piece of a source: where it begins and where it ends, in UTF-16 units. */
export interface Range {
	from: number;
	to: number;
}

export interface WrittenAttribute {
	name: string;
	value: string;
	nameAt: Range;
	/** Without its quotes. */
	valueAt: Range;
}

/** A directive as it stands in a source, half typed or whole. */
export interface WrittenDirective extends Range {
	name: string;
	nameAt: Range;
	/** One in a sentence, two on a line of its own, three around text. */
	colons: number;
	attributes: WrittenAttribute[];
	/** What stands between the braces; null where there are none. */
	inside: Range | null;
	closed: boolean;
}

const written = /:{1,3}([a-z][\w-]*)(?:\{([^{}]*)(\})?)?/gi;
const attribute = /([\w-]+)(?:=(?:"([^"]*)"?|'([^']*)'?|([^\s"'{}]*)))?/g;

function attributesOf(inside: string, at: number): WrittenAttribute[] {
	return [...inside.matchAll(attribute)].map((match) => {
		const [raw, name = '', double, single, bare] = match;
		const value = double ?? single ?? bare ?? '';
		const from = at + match.index;
		const quoted = double !== undefined || single !== undefined;
		const valueFrom = raw.includes('=') ? from + name.length + (quoted ? 2 : 1) : from + name.length;
		return {
			name,
			value,
			nameAt: { from, to: from + name.length },
			valueAt: { from: valueFrom, to: valueFrom + value.length }
		};
	});
}

/** Every directive of a source, in order: what the renderer would try to read as one. */
export function writtenDirectives(source: string): WrittenDirective[] {
	return [...source.matchAll(written)].flatMap((match) => {
		const [raw, name = '', inside, brace] = match;
		const from = match.index;
		const colons = raw.length - raw.replace(/^:+/, '').length;
		const before = source[from - 1] ?? '\n';
		// A colon in a word or a time is none; two begin a line; in a sentence the braces make it one.
		const begins = colons > 1 ? /[\n\s>]/.test(before) : !/[\w:]/.test(before) && inside !== undefined;
		if (!begins || (colons > 1 && inside?.includes('\n'))) return [];
		const nameFrom = from + colons;
		const insideFrom = nameFrom + name.length + 1;
		return {
			name: name.toLowerCase(),
			nameAt: { from: nameFrom, to: nameFrom + name.length },
			colons,
			from,
			to: from + raw.length,
			attributes: inside === undefined ? [] : attributesOf(inside, insideFrom),
			inside: inside === undefined ? null : { from: insideFrom, to: insideFrom + inside.length },
			closed: brace !== undefined
		};
	});
}

/** The directive a place of a source is in; undefined in plain text. */
export const directiveAt = (source: string, at: number): WrittenDirective | undefined =>
	writtenDirectives(source).find(({ from, to }) => from <= at && at <= to);
