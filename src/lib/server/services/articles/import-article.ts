import { may } from '../../../domain/people/policy';
import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import { revisionSave } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as campaigns from '../../db/queries/campaign-choice';
import { createArticle } from './create-article';
import { readImport, type SentArticle } from './read-import';
import { saveRevisionIn } from './save-revision';
import { enterPictures } from './take-in-picture';
import { templatesInUse } from './templates-in-use';

export interface SentNewArticle extends SentArticle {
	/** In place of the file's; empty for that. */
	title: string;
	/** In place of the file's; empty for those. */
	campaigns: string[];
}

type Reason = 'forbidden' | 'invalid' | 'conflict' | 'too_many' | 'not_found';
const fault = (field: string, message: string) =>
	refuse('invalid', `${message} Nothing was changed.`, { fields: { [field]: [message] } });

/** The campaigns by their names; one that does not exist is named, with those that are near. */
async function campaignIds(ctx: Context, names: string[]): Promise<Outcome<number[], 'invalid'>> {
	if (names.length === 0)
		return fault(
			'campaigns',
			'The file names no campaign. Choose at least one: its numbers are what the article may print.'
		);
	if (names.length > 12) return fault('campaigns', 'An article can use twelve campaigns at most.');
	const found = new Map((await campaigns.idsOf(ctx.db, names)).map((one) => [one.slug, one.id]));
	const unknown = names.filter((name) => !found.has(name));
	if (unknown.length === 0) return done(names.flatMap((name) => found.get(name) ?? []));
	const there = (await campaigns.open(ctx.db)).map((one) => one.slug);
	const words = unknown.map((name) => {
		const near = nearest(name, there);
		return `There is no campaign “${name}”.${near.length > 0 ? ` Near: ${near.join(', ')}.` : ''}`;
	});
	return fault('campaigns', `${words.join(' ')} Choose those it is to use.`);
}

async function templateFault(ctx: Context, name: string | undefined): Promise<string | null> {
	if (name === undefined) return null;
	const all = (await templatesInUse(ctx.db)).filter(({ retired }) => !retired).map(({ kind }) => kind);
	if (all.includes(name)) return null;
	const near = nearest(name, all);
	return `There is no template “${name}”. ${near.length > 0 ? `Near: ${near.join(', ')}.` : `There are ${all.join(', ')}.`}`;
}

function readText(title: string, standfirst: string, source: string) {
	const read = revisionSave.safeParse({ title, standfirst, source, basedOn: 1 });
	const [issue] = read.error?.issues ?? [];
	return read.success
		? done(read.data)
		: fault(String(issue?.path[0] ?? 'file'), issue?.message ?? 'The text cannot be saved.');
}

/** Makes a new article of the actor's from a Markdown file, or from a zip of one with its pictures. All of it, or nothing. */
export async function importArticle(
	ctx: Context,
	sent: SentNewArticle
): Promise<Outcome<{ slug: string; notes: string[] }, Reason>> {
	if (!may(ctx.actor, 'article.create'))
		return refuse('forbidden', 'Only writers and editors start articles.');
	const read = await readImport(ctx, sent);
	if (!read.ok) return read;
	const { head, source, pictures, notes } = read.value;
	const title = sent.title || (head.title ?? '');
	if (title === '') return fault('title', 'The file has no title: write one here.');
	const text = readText(title, head.standfirst ?? '', source);
	if (!text.ok) return text;
	const template = head.template ?? 'short-note';
	const wrong = await templateFault(ctx, head.template);
	if (wrong) return fault('file', wrong);
	const slug = slugOf(text.value.title);
	if (slug === '' || isReserved(slug))
		return fault('title', 'This title cannot make an address: use a few letters or words more.');
	const names = [...new Set(sent.campaigns.length > 0 ? sent.campaigns : head.campaigns)];
	const ids = await campaignIds(ctx, names);
	if (!ids.ok) return ids;
	try {
		return await inTransaction(ctx.db, async (tx) => {
			await enterPictures(ctx, tx, pictures);
			await createArticle(ctx, tx, {
				...{ slug, title: text.value.title, standfirst: text.value.standfirst, template },
				...{ source: text.value.source, campaignIds: ids.value },
				note: `from ${sent.fileName}`.slice(0, 200),
				log: { campaigns: names, importedFrom: sent.fileName, pictures: pictures.length }
			});
			return done({ slug, notes });
		});
	} catch (error) {
		if (!isDuplicate(error)) throw error;
		if (!(await articles.bySlug(ctx.db, slug)))
			return refuse(
				'conflict',
				'Somebody sent one of its pictures at the same moment. Import it again. Nothing was changed.'
			);
		const taken =
			'Another article has this title, or one that makes the same address. Write another here, or import the file on that article’s own page.';
		return refuse('conflict', `${taken} Nothing was changed.`, { fields: { title: [taken] } });
	}
}

/** Saves a file's text as the next revision of an article; its campaigns and its template stay. */
export async function importRevision(
	ctx: Context,
	slug: string,
	sent: SentArticle & { basedOn: number }
): Promise<Outcome<{ revision: number; changed: boolean; notes: string[] }, Reason>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const there = await articles.bySlug(ctx.db, slug);
	if (!there) return refuse('not_found', 'There is no such article.');
	if (!may(ctx.actor, 'article.edit', { authorId: there.article.authorId }))
		return refuse('forbidden', 'Only its author and the editors can change this article.');
	const read = await readImport(ctx, sent);
	if (!read.ok) return read;
	const { head, source, pictures, notes } = read.value;
	const text = readText(
		head.title ?? there.article.title,
		head.standfirst ?? there.article.standfirst,
		source
	);
	if (!text.ok) return text;
	return inTransaction(ctx.db, async (tx) => {
		const input = { ...text.value, basedOn: sent.basedOn };
		const saved = await saveRevisionIn(ctx, tx, slug, input, `from ${sent.fileName}`.slice(0, 200));
		if (!saved.ok) return saved;
		await enterPictures(ctx, tx, pictures);
		return done({ revision: saved.value.revision, changed: saved.value.changed, notes });
	});
}
