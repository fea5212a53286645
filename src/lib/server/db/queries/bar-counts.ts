import { and, count, eq, inArray, isNull, lte, ne, or } from 'drizzle-orm';
import type { Db } from '../client';
import { article, campaign, loan } from '../schema';

/** Articles on which somebody can act: other people's in review and approved ones for an editor, one's own with changes asked. */
export async function waitingArticles(db: Db, personId: string, isEditor: boolean): Promise<number> {
	const own = and(eq(article.stage, 'changes-asked'), eq(article.authorId, personId));
	const toReview = and(eq(article.stage, 'in-review'), ne(article.authorId, personId));
	const [row] = await db
		.select({ n: count() })
		.from(article)
		.where(isEditor ? or(own, toReview, eq(article.stage, 'approved')) : own);
	return row?.n ?? 0;
}

/** Campaigns that are not put away. */
export async function openCampaigns(db: Db): Promise<number> {
	const [row] = await db.select({ n: count() }).from(campaign).where(isNull(campaign.archivedAt));
	return row?.n ?? 0;
}

/** Loans that are here, or on their way back, and due on a day or before it. */
export async function loansDue(db: Db, day: string): Promise<number> {
	const [row] = await db
		.select({ n: count() })
		.from(loan)
		.where(and(inArray(loan.stage, ['here', 'going-back']), lte(loan.dueOn, day)));
	return row?.n ?? 0;
}
