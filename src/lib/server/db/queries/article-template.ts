import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { articleTemplate, templateRevision, user } from '../schema';

const newest = {
	id: articleTemplate.id,
	kind: articleTemplate.kind,
	head: articleTemplate.head,
	retiredAt: articleTemplate.retiredAt,
	version: articleTemplate.version,
	name: templateRevision.name,
	title: templateRevision.title,
	standfirst: templateRevision.standfirst,
	for: templateRevision.purpose,
	body: templateRevision.body,
	checklist: templateRevision.checklist,
	savedAt: templateRevision.savedAt,
	savedBy: user.name
};

/** Every template of the lab's own with its newest revision, retired ones too; of some kinds alone where named. */
export const all = (db: Db, kinds?: string[]) =>
	db
		.select(newest)
		.from(articleTemplate)
		.innerJoin(
			templateRevision,
			and(
				eq(templateRevision.templateId, articleTemplate.id),
				eq(templateRevision.number, articleTemplate.head)
			)
		)
		.innerJoin(user, eq(user.id, templateRevision.savedBy))
		.where(kinds ? inArray(articleTemplate.kind, kinds) : undefined)
		.orderBy(asc(templateRevision.name), asc(articleTemplate.id));

/** The saves of a template, newest first. */
export const revisionsOf = (db: Db, templateId: number, limit: number) =>
	db
		.select({
			number: templateRevision.number,
			savedAt: templateRevision.savedAt,
			savedBy: user.name,
			note: templateRevision.note
		})
		.from(templateRevision)
		.innerJoin(user, eq(user.id, templateRevision.savedBy))
		.where(eq(templateRevision.templateId, templateId))
		.orderBy(desc(templateRevision.number))
		.limit(limit);

export async function insert(db: Db, kind: string): Promise<number> {
	const [created] = await db.insert(articleTemplate).values({ kind, head: 1 }).$returningId();
	if (!created) throw new Error('The database gave no id for the template.');
	return created.id;
}

export const addRevision = (db: Db, row: typeof templateRevision.$inferInsert) =>
	db.insert(templateRevision).values(row);

/** Writes over the version that was seen; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: { head?: number; retiredAt?: Date | null }
): Promise<boolean> {
	const [result] = await db
		.update(articleTemplate)
		.set({ ...change, version: sql`${articleTemplate.version} + 1` })
		.where(and(eq(articleTemplate.id, id), eq(articleTemplate.version, seen)));
	return result.affectedRows === 1;
}
