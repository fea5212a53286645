import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import type { Outcome } from '../../../src/lib/domain/shared/outcome';
import { articleStart, revisionSave } from '../../../src/lib/schemas/article';
import type { Db } from '../../../src/lib/server/db/client';
import { bySlug } from '../../../src/lib/server/db/queries/article';
import { mail } from '../../../src/lib/server/db/schema';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { startArticle } from '../../../src/lib/server/services/articles/start-article';
import { contextFor } from '../../support/context';
import { sourceOf } from './measured-campaign';

export type People = Record<Role, Actor>;

/** The value of an outcome that the test counts on. */
export function wanted<T>(outcome: Outcome<T>): T {
	if (!outcome.ok) throw new Error(`${outcome.reason}: ${outcome.message}`);
	return outcome.value;
}

/** The row of an article as it stands. */
export async function rowOf(db: Db, slug: string) {
	const found = await bySlug(db, slug);
	if (!found) throw new Error(`There is no article ${slug}.`);
	return found.article;
}

export const versionOf = async (db: Db, slug: string) => (await rowOf(db, slug)).version;

export const title = 'Brisk against Pennon';
export const slug = 'brisk-against-pennon';

/** Starts an article as the writer and saves a text that names the campaign's data. */
export async function writtenArticle(
	db: Db,
	author: Actor,
	{
		campaign = 'aldermoor-1650-first-look',
		source = sourceOf(campaign),
		now = new Date('2026-11-11T08:00:00Z')
	} = {}
): Promise<void> {
	const ctx = contextFor(db, author, now);
	wanted(
		await startArticle(ctx, articleStart.parse({ title, template: 'short-note', campaigns: [campaign] }))
	);
	const saved = await saveRevision(
		ctx,
		slug,
		revisionSave.parse({ title, standfirst: 'What a fixed clock costs.', source, basedOn: 1 })
	);
	wanted(saved);
}

/** Subjects of the outbox, by the recipient's name before the @. */
export async function outbox(db: Db): Promise<string[]> {
	const rows = await db.select().from(mail).orderBy(mail.id);
	return rows.map((row) => `${row.recipient.split('@')[0]}: ${row.subject}`);
}
