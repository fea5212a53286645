import { picturesIn } from '../../../domain/articles/pictures/picture';
import { outOfStore } from '../../../domain/articles/pictures/relative-pictures';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as pictures from '../../db/queries/picture';
import * as revisions from '../../db/queries/revision';
import { checksumFile, sha256Of, writeChecksums } from '../../files/article-file/checksums';
import { writeArticleFile } from '../../files/article-file/front-matter';
import { writeZip, type ZipEntry } from '../../files/article-file/write-zip';
import { files } from '../../files/files';
import { pictureKey } from '../../files/picture-key';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const whole = (content: Uint8Array) =>
	async function* () {
		yield await Promise.resolve(content);
	};

/** The pictures of a text as entries of a zip, each by its hash; the first whose file is not in the store refuses. */
async function pictureEntries(
	ctx: Context,
	source: string
): Promise<Outcome<{ entry: ZipEntry; sha256: string }[], 'gone'>> {
	const known = await pictures.factsOf(ctx.db, picturesIn(source));
	const found = await Promise.all(
		known.map(async ({ sha256 }) => ({ sha256, file: await files().find(pictureKey(sha256, 'whole')) }))
	);
	const lost = found.find(({ file }) => file === null);
	if (lost)
		return refuse(
			'gone',
			`The file of the picture ${lost.sha256.slice(0, 12)}… is not in the data folder. Bring it back from a backup first.`
		);
	return done(
		found.flatMap(({ sha256, file }) =>
			file ? [{ sha256, entry: { name: `pictures/${sha256}.webp`, packs: false, content: file.stream } }] : []
		)
	);
}

/** An article as a zip: its text with a head, its pictures, and a list of checksums. It imports back to the same. */
export async function exportArticle(
	ctx: Context,
	slug: string
): Promise<
	Outcome<{ fileName: string; content: AsyncGenerator<Uint8Array> }, 'not_found' | 'forbidden' | 'gone'>
> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { article } = found;
	const [head, bound] = await Promise.all([
		revisions.byNumber(ctx.db, article.id, article.head),
		articles.campaignsOf(ctx.db, article.id)
	]);
	if (!head) throw new Error(`Article ${article.id} has no revision ${article.head}.`);
	const shown = await pictureEntries(ctx, head.source);
	if (!shown.ok) return shown;
	const { title, standfirst, number, label } = head;
	const text = bytesOf(
		writeArticleFile(
			{
				...{ title, standfirst, template: article.template, campaigns: bound.map((one) => one.slug) },
				revision: { number, ...(label === null ? {} : { name: label }) }
			},
			outOfStore(head.source)
		)
	);
	const sums = writeChecksums([
		{ name: 'article.md', sha256: sha256Of(text) },
		...shown.value.map(({ sha256, entry }) => ({ name: entry.name, sha256 }))
	]);
	const entries: ZipEntry[] = [
		{ name: 'article.md', packs: true, content: whole(text) },
		...shown.value.map(({ entry }) => entry),
		{ name: checksumFile, packs: true, content: whole(bytesOf(sums)) }
	];
	return done({ fileName: `${slug}-r${number}.zip`, content: writeZip(entries, head.savedAt) });
}
