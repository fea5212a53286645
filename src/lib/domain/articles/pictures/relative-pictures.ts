import { eachToken, parseMarkdown } from '../markdown';
import { pictureAddress } from './picture';

/** An image of a source that is named by a path beside it. */
export interface RelativePicture {
	/** As the source names it. */
	href: string;
	/** The same as a path from the root of the files, `..` and `.` taken out; null where it leads out of them. */
	path: string | null;
	alt: string;
	line: number;
}

const decoded = (href: string): string => {
	try {
		return decodeURIComponent(href);
	} catch {
		return href;
	}
};

/** A path beside a file, from the root of all files; null where it leads out of them. @example besides('a/b.md', '../c.jpg') === 'c.jpg' */
export function besides(file: string, href: string): string | null {
	const out = file.split('/').slice(0, -1);
	for (const part of decoded(href.replace(/[?#].*$/, '')).split('/')) {
		if (part === '..') {
			if (out.pop() === undefined) return null;
		} else if (part !== '.' && part !== '') out.push(part);
	}
	return out.join('/');
}

const isRelative = (href: string): boolean => href !== '' && !/^(?:[a-z][a-z0-9+.-]*:|\/|#|\\)/i.test(href);

/** The images of a source that lie beside it, each path once. Call it for a source that may be set (`refusalOf`). */
export function relativePictures(source: string, file: string): RelativePicture[] {
	const found = new Map<string, RelativePicture>();
	eachToken(parseMarkdown(source), (token) => {
		if (token.type !== 'image' || !('href' in token)) return;
		const href = String(token.href);
		if (!isRelative(href) || found.has(decoded(href))) return;
		const alt = 'text' in token ? String(token.text) : '';
		found.set(decoded(href), { href: decoded(href), path: besides(file, href), alt, line: token.line ?? 1 });
	});
	return [...found.values()];
}

const destination = String.raw`<[^<>\n]*>|[^\s<>()]+(?:\([^\s()]*\)[^\s<>()]*)*`;
const inImage = new RegExp(String.raw`(!\[(?:[^[\]\\]|\\.|\[[^\]]*\])*\]\(\s*)(${destination})`, 'g');
const inDefinition = new RegExp(String.raw`(^ {0,3}\[[^\]\n]+\]:[ \t]*)(<[^<>\n]*>|\S+)`, 'gm');

/** A source with the paths of its images put for others. @param to what stands for a path; undefined leaves it */
export function repathed(source: string, to: (href: string) => string | undefined): string {
	const swap = (whole: string, lead: string, written: string) => {
		const href = decoded(written.replace(/^<|>$/g, ''));
		const other = isRelative(href) ? to(href) : undefined;
		return other === undefined ? whole : `${lead}${other}`;
	};
	return source.replace(inImage, swap).replace(inDefinition, swap);
}

const stored = /(?<![\w/.:-])\/pictures\/([0-9a-f]{64})\.webp/g;
const beside = /(?<![\w/.:-])pictures\/([0-9a-f]{64})\.webp/g;

/** A source whose stored pictures lie beside it, as in an exported file. */
export const outOfStore = (source: string): string => source.replace(stored, 'pictures/$1.webp');
/** The way back, for those pictures that are in the store now. */
export const intoStore = (source: string, known: ReadonlySet<string>): string =>
	source.replace(beside, (whole, hash: string) => (known.has(hash) ? pictureAddress(hash) : whole));
