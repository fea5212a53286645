import { and, asc, eq, inArray, isNull, ne } from 'drizzle-orm';
import type { Role } from '../../../domain/people/roles';
import type { Db } from '../client';
import { articleCampaign, campaign, rigSample, run, sample, user, userRole } from '../schema';

/** Somebody a mail can go to. */
export interface Recipient {
	id: string;
	name: string;
	email: string;
}

const person = { id: user.id, name: user.name, email: user.email };

/** People who hold a role and have not left. */
export const withRole = (db: Db, role: Role): Promise<Recipient[]> =>
	db
		.select(person)
		.from(user)
		.innerJoin(userRole, eq(userRole.userId, user.id))
		.where(and(eq(userRole.role, role), isNull(user.leftAt)))
		.orderBy(asc(user.email));

/** One person, if they have not left. */
export const personById = (db: Db, id: string): Promise<Recipient[]> =>
	db
		.select(person)
		.from(user)
		.where(and(eq(user.id, id), isNull(user.leftAt)));

/** Who measured what an article's campaigns hold: everybody with a run that stands. */
export const testersOf = (db: Db, articleId: number): Promise<Recipient[]> =>
	db
		.selectDistinct(person)
		.from(articleCampaign)
		.innerJoin(run, and(eq(run.campaignId, articleCampaign.campaignId), isNull(run.voidedAt)))
		.innerJoin(user, and(eq(user.id, run.testerId), isNull(user.leftAt)))
		.where(eq(articleCampaign.articleId, articleId))
		.orderBy(asc(user.email));

/** Whether an article's campaigns used a sample that was not bought. */
export const usesLentSamples = async (db: Db, articleId: number): Promise<boolean> =>
	(
		await db
			.select({ id: sample.id })
			.from(articleCampaign)
			.innerJoin(campaign, eq(campaign.id, articleCampaign.campaignId))
			.innerJoin(rigSample, eq(rigSample.rigRevisionId, campaign.rigRevisionId))
			.innerJoin(sample, and(eq(sample.id, rigSample.sampleId), ne(sample.provenance, 'bought')))
			.where(inArray(articleCampaign.articleId, [articleId]))
			.limit(1)
	).length > 0;
