import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedSince, checksumFile } from './checksums';
import { readArticleFile, type ArticleFile } from './front-matter';
import { isZip, readZip } from './read-zip';

/** An article as it came: its text taken apart, and the files that lie beside it. */
export interface ReadFile extends ArticleFile {
	/** The name of the text in the zip, by which paths beside it are found. */
	name: string;
	beside: ReadonlyMap<string, Uint8Array>;
	notes: string[];
}

function textOf(bytes: Uint8Array, name: string): Outcome<string, 'invalid'> {
	if (bytes.byteLength > 2_500_000)
		return refuse(
			'invalid',
			`“${name}” is too long: a text has at most 400,000 characters. Nothing was changed.`
		);
	try {
		const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
		if (!text.includes('\0')) return done(text);
	} catch {
		// Said below, like a text with bytes that no text has.
	}
	return refuse('invalid', `“${name}” is not text in UTF-8. Save it as UTF-8 first. Nothing was changed.`);
}

/** Which file of a zip is the article: `article.md`, else the only Markdown there is. */
function articleIn(files: ReadonlyMap<string, Uint8Array>): Outcome<string, 'invalid'> {
	const texts = [...files.keys()].filter((name) => /\.(md|markdown)$/i.test(name));
	const named = texts.filter((name) => /(^|\/)article\.md$/i.test(name));
	const [only, ...more] = named.length > 0 ? named : texts;
	if (only === undefined)
		return refuse('invalid', 'The zip has no Markdown file (.md) in it. Nothing was changed.');
	if (more.length === 0) return done(only);
	return refuse(
		'invalid',
		`The zip has several Markdown files (${[only, ...more].slice(0, 4).join(', ')}): call the article “article.md”. Nothing was changed.`
	);
}

function checked(name: string, files: ReadonlyMap<string, Uint8Array>): Outcome<string[], 'invalid'> {
	const folder = name.replace(/[^/]*$/, '');
	const list = files.get(folder + checksumFile);
	if (!list) return done([]);
	const changed = changedSince(new TextDecoder().decode(list), (one) => files.get(folder + one));
	const others = changed.filter((one) => folder + one !== name);
	if (others.length > 0)
		return refuse(
			'invalid',
			`Not as they were when the article was exported, by its list of checksums: ${others.slice(0, 6).join(', ')}. Export it again, or take ${checksumFile} out of the zip. Nothing was changed.`
		);
	return done(changed.length > 0 ? ['The text was changed after the export.'] : []);
}

/** Reads an article that somebody sends: a Markdown file, or a zip of one with its pictures. */
export function readArticleUpload(bytes: Uint8Array, fileName: string): Outcome<ReadFile, 'invalid'> {
	let [name, beside]: [string, ReadonlyMap<string, Uint8Array>] = [fileName, new Map([[fileName, bytes]])];
	let notes: string[] = [];
	if (isZip(bytes)) {
		const files = readZip(bytes);
		if (!files.ok) return files;
		const article = articleIn(files.value);
		if (!article.ok) return article;
		const sums = checked(article.value, files.value);
		if (!sums.ok) return sums;
		[name, beside, notes] = [article.value, files.value, sums.value];
	} else if (!/\.(md|markdown|txt)$/i.test(fileName))
		return refuse(
			'invalid',
			'Choose a Markdown file (.md), or a zip of one with its pictures. Nothing was changed.'
		);
	const text = textOf(beside.get(name) ?? new Uint8Array(), name);
	if (!text.ok) return text;
	const file = readArticleFile(text.value);
	return file.ok ? done({ ...file.value, name, beside, notes }) : file;
}
