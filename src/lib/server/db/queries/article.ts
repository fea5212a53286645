import { and, eq, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { article, articleCampaign, campaign, user } from '../schema';

export type ArticleRow = typeof article.$inferSelect;

/** An article by its slug, with its author's name and address. */
export const bySlug = async (db: Db, slug: string) =>
	(
		await db
			.select({ article, authorName: user.name, authorEmail: user.email })
			.from(article)
			.innerJoin(user, eq(user.id, article.authorId))
			.where(eq(article.slug, slug))
			.limit(1)
	)[0];

/** Takes the row for this transaction alone; nobody else moves or saves it meanwhile. */
export const lock = async (db: Db, id: number): Promise<ArticleRow | undefined> =>
	(await db.select().from(article).where(eq(article.id, id)).for('update'))[0];

export const lockBySlug = async (db: Db, slug: string): Promise<ArticleRow | undefined> =>
	(await db.select().from(article).where(eq(article.slug, slug)).for('update'))[0];

export async function insert(db: Db, row: typeof article.$inferInsert): Promise<number> {
	const [created] = await db.insert(article).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the article.');
	return created.id;
}

/** Changes the version that was seen and raises it; says whether a row was changed. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof article.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(article)
		.set({ ...change, version: sql`${article.version} + 1` })
		.where(and(eq(article.id, id), eq(article.version, seen)));
	return result.affectedRows === 1;
}

/** The campaigns of an article, in its order. */
export const campaignsOf = (db: Db, articleId: number) =>
	db
		.select({
			id: campaign.id,
			slug: campaign.slug,
			name: campaign.name,
			rigRevisionId: campaign.rigRevisionId
		})
		.from(articleCampaign)
		.innerJoin(campaign, eq(campaign.id, articleCampaign.campaignId))
		.where(eq(articleCampaign.articleId, articleId))
		.orderBy(articleCampaign.position);

/** Sets the campaigns of an article, in this order. */
export async function setCampaigns(db: Db, articleId: number, campaignIds: number[]): Promise<void> {
	await db.delete(articleCampaign).where(eq(articleCampaign.articleId, articleId));
	if (campaignIds.length === 0) return;
	await db
		.insert(articleCampaign)
		.values(campaignIds.map((campaignId, position) => ({ articleId, campaignId, position })));
}
