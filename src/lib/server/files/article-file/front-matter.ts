import { LineCounter, parseDocument, stringify } from 'yaml';
import { z } from 'zod';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';

/** What stands at the head of an article's file. */
export interface FrontMatter {
	title?: string;
	standfirst?: string;
	template?: string;
	campaigns: string[];
	tags: string[];
}

/** An article's file, taken apart. */
export interface ArticleFile {
	head: FrontMatter;
	source: string;
	/** Names in the head that nothing is made of. */
	unused: string[];
}

const names = z
	.union([z.string(), z.array(z.string())], 'Write a name, or a list of names.')
	.transform((given) => (typeof given === 'string' ? [given] : given).map((one) => one.trim()))
	.default([]);
const words = z.string('Write text here, in quotes where it begins with a sign.').trim();
const shape = z.object({
	title: words.max(200, 'Keep the title to 200 characters.').optional(),
	standfirst: words.max(500, 'Keep the standfirst to 500 characters.').optional(),
	template: words.max(60).optional(),
	campaigns: names,
	tags: names
});
/** Said by an export, for people; nothing is made of it on the way in. */
const told = new Set(['revision']);

const longestHead = 20_000;
const fence = /^---[ \t]*\n([\s\S]*?)^(?:---|\.\.\.)[ \t]*(?:\n|$)/m;

const no = (line: number, message: string) =>
	refuse('invalid', `The head of the file cannot be read, on line ${line}: ${message} Nothing was changed.`);

function readHead(yaml: string): Outcome<{ head: FrontMatter; unused: string[] }, 'invalid'> {
	const lines = new LineCounter();
	const document = parseDocument(yaml, { lineCounter: lines, schema: 'core', uniqueKeys: true });
	// One line on, for the mark above the head.
	const lineAt = (offset: number | undefined) => lines.linePos(offset ?? 0).line + 1;
	const [broken] = document.errors;
	if (broken)
		return no(lineAt(broken.pos[0]), `${broken.message.split(/ at line | in "|\n/)[0] ?? 'it is no YAML'}.`);
	let value: unknown;
	try {
		value = document.toJS({ maxAliasCount: 20 });
	} catch {
		return no(2, 'it refers to itself too often.');
	}
	if (value === null) return done({ head: shape.parse({}), unused: [] });
	if (typeof value !== 'object' || Array.isArray(value)) return no(2, 'write name: value, a line to each.');
	const checked = shape.safeParse(value);
	if (!checked.success) {
		const [issue] = checked.error.issues;
		const key = String(issue?.path[0] ?? '');
		const node = document.get(key, true) as { range?: [number, number, number] } | undefined;
		return no(lineAt(node?.range?.[0]), `“${key}”. ${issue?.message ?? ''}`);
	}
	const unused = Object.keys(value).filter((key) => !(key in shape.shape) && !told.has(key));
	return done({ head: checked.data, unused });
}

/**
 * Takes an article's file apart: its head between `---` lines, then its text. Without a head the title is the first
 * heading. What cannot be read is refused with its line.
 */
export function readArticleFile(text: string): Outcome<ArticleFile, 'invalid'> {
	const whole = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
	if (!/^---[ \t]*\n/.test(whole)) {
		const [, title, rest] = /^\s*#[ \t]+(.+?)[ \t#]*\n+([\s\S]*)$/.exec(whole) ?? [];
		return done({ head: shape.parse({ title }), source: rest ?? whole, unused: [] });
	}
	const match = fence.exec(whole);
	if (!match || match.index !== 0) return no(1, 'its end is missing: a line of --- alone.');
	if ((match[1]?.length ?? 0) > longestHead) return no(1, 'it is longer than 20,000 characters.');
	const head = readHead(match[1] ?? '');
	if (!head.ok) return head;
	return done({ ...head.value, source: whole.slice(match[0].length).replace(/^\n/, '') });
}

export interface WrittenHead {
	title: string;
	standfirst: string;
	template: string;
	campaigns: string[];
	revision: { number: number; name?: string };
}

/** An article as a file: its head, an empty line, its text to the letter. */
export const writeArticleFile = (head: WrittenHead, source: string): string =>
	`---\n${stringify(head, { lineWidth: 0, defaultStringType: 'PLAIN' })}---\n\n${source}`;
