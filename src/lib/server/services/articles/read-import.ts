import { refusalOf } from '../../../domain/articles/limits';
import { pictureAddress, picturesIn } from '../../../domain/articles/pictures/picture';
import {
	intoStore,
	relativePictures,
	repathed,
	type RelativePicture
} from '../../../domain/articles/pictures/relative-pictures';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as pictures from '../../db/queries/picture';
import type { FrontMatter } from '../../files/article-file/front-matter';
import { readArticleUpload, type ReadFile } from '../../files/article-file/read-article-zip';
import { mostPictures, readyPictures, type ReadyPicture } from './take-in-picture';

/** A file somebody sends to be an article. */
export interface SentArticle {
	bytes: Uint8Array;
	fileName: string;
	/** Whether pictures that are not in the file may stay as they are named, to be put in later. */
	keepMissing: boolean;
}

/** An article that is ready to be written: nothing of it is entered yet. */
export interface ReadImport {
	head: FrontMatter;
	source: string;
	pictures: ReadyPicture[];
	/** What was left aside, in sentences. */
	notes: string[];
}

const namesOf = (names: string[]) =>
	names.length > 6 ? `${names.slice(0, 6).join(', ')} and ${names.length - 6} more` : names.join(', ');

/** The pictures that are named and are neither in the file nor in the store. */
async function missingOf(ctx: Context, file: ReadFile, beside: RelativePicture[]): Promise<string[]> {
	const stored = picturesIn(file.source);
	const known = new Set((await pictures.factsOf(ctx.db, stored)).map((one) => one.sha256));
	const relative = beside.filter(({ path }) => path === null || !file.beside.has(path));
	// What an export left beside the text is in the store under the same name.
	const named = picturesIn(relative.map(({ href }) => `/${href}`).join(' '));
	const here = new Set((await pictures.factsOf(ctx.db, named)).map((one) => one.sha256));
	return [
		...relative
			.filter(({ href }) => ![...here].some((hash) => href === `pictures/${hash}.webp`))
			.map(({ href }) => href),
		...stored
			.filter((hash) => !known.has(hash) && !here.has(hash))
			.map((hash) => `${hash.slice(0, 12)}….webp`)
	];
}

/**
 * Reads a sent article down to what can be written: its pictures decoded and made ready, their paths put for their
 * addresses. Refused whole, with what is wrong in words, while nothing has changed.
 */
export async function readImport(
	ctx: Context,
	sent: SentArticle
): Promise<Outcome<ReadImport, 'invalid' | 'too_many'>> {
	const read = readArticleUpload(sent.bytes, sent.fileName);
	if (!read.ok) return read;
	const file = read.value;
	const unfit = refusalOf(file.source);
	if (unfit)
		return refuse(
			'invalid',
			`Line ${unfit.line} of the text: ${unfit.message.replace(/ What you typed.*/, '')} Nothing was changed.`
		);
	const beside = relativePictures(file.source, file.name);
	const missing = await missingOf(ctx, file, beside);
	if (missing.length > 0 && !sent.keepMissing)
		return refuse(
			'invalid',
			`These pictures are named and are not in the file: ${namesOf(missing)}. Nothing was changed.`
		);
	const inFile = beside.flatMap((one) => {
		const bytes = one.path === null ? undefined : file.beside.get(one.path);
		return bytes ? [{ ...one, bytes }] : [];
	});
	if (inFile.length > mostPictures)
		return refuse(
			'invalid',
			`The text names ${inFile.length} pictures; at most ${mostPictures} are taken. Nothing was changed.`
		);
	const ready = await readyPictures(
		ctx,
		inFile.map(({ bytes, path, alt }) => ({
			...{ bytes, alt: alt.slice(0, 500), credit: '' },
			fileName: path?.split('/').at(-1) ?? ''
		}))
	);
	if (!ready.ok) return ready;
	const addresses = new Map(
		inFile.map(({ href }, index) => [href, pictureAddress(ready.value[index]?.row.sha256 ?? '')])
	);
	const repointed = repathed(file.source, (href) => addresses.get(href));
	const named = picturesIn(repointed.replaceAll('pictures/', '/pictures/'));
	const known = new Set([
		...(await pictures.factsOf(ctx.db, named)).map((one) => one.sha256),
		...ready.value.map(({ row }) => row.sha256)
	]);
	return done({
		head: file.head,
		source: intoStore(repointed, known),
		pictures: ready.value,
		notes: [
			...file.notes,
			...(file.unused.length > 0 ? [`Of its head nothing was made of: ${namesOf(file.unused)}.`] : []),
			...(file.head.tags.length > 0 ? [`Its tags were left aside: ${namesOf(file.head.tags)}.`] : []),
			...(missing.length > 0 ? [`Pictures still to be put in: ${namesOf(missing)}.`] : []),
			...ready.value.flatMap(({ notes, row }) => notes.map((note) => `${row.fileName}: ${note}`))
		]
	});
}
