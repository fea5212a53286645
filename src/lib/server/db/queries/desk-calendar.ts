import { and, asc, eq, gte, inArray, isNull, lt, notInArray } from 'drizzle-orm';
import type { Db } from '../client';
import {
	article,
	articleCampaign,
	campaign,
	edition,
	embargo,
	loan,
	loanSample,
	part,
	rigSample,
	sample
} from '../schema';

export interface Span {
	from: Date;
	to: Date;
}

/** Articles whose slot falls in a span and that have not gone out. */
export const slots = (db: Db, { from, to }: Span) =>
	db
		.select({ at: article.slotAt, slug: article.slug, title: article.title, stage: article.stage })
		.from(article)
		.where(
			and(
				gte(article.slotAt, from),
				lt(article.slotAt, to),
				notInArray(article.stage, ['published', 'withdrawn'])
			)
		)
		.orderBy(asc(article.slotAt));

/** Editions that went out in a span. */
export const printed = (db: Db, { from, to }: Span) =>
	db
		.select({
			at: edition.publishedAt,
			slug: article.slug,
			title: edition.title,
			number: edition.number,
			stage: article.stage
		})
		.from(edition)
		.innerJoin(article, eq(article.id, edition.articleId))
		.where(and(gte(edition.publishedAt, from), lt(edition.publishedAt, to)))
		.orderBy(asc(edition.publishedAt));

/** Embargoes that end in a span, on samples behind articles in progress. */
export const embargoes = (db: Db, { from, to }: Span) =>
	db
		.selectDistinct({ at: embargo.until, maker: part.maker, model: part.model })
		.from(embargo)
		.innerJoin(sample, eq(sample.id, embargo.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.innerJoin(rigSample, eq(rigSample.sampleId, sample.id))
		.innerJoin(campaign, eq(campaign.rigRevisionId, rigSample.rigRevisionId))
		.innerJoin(articleCampaign, eq(articleCampaign.campaignId, campaign.id))
		.innerJoin(article, eq(article.id, articleCampaign.articleId))
		.where(
			and(
				isNull(embargo.liftedAt),
				gte(embargo.until, from),
				lt(embargo.until, to),
				notInArray(article.stage, ['published', 'withdrawn'])
			)
		)
		.orderBy(asc(embargo.until));

/** Loans due back between two days, the last not counted. */
export const loansDue = (db: Db, from: string, to: string) =>
	db
		.select({ dueOn: loan.dueOn, maker: part.maker, model: part.model })
		.from(loan)
		.innerJoin(loanSample, eq(loanSample.loanId, loan.id))
		.innerJoin(sample, eq(sample.id, loanSample.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.where(and(inArray(loan.stage, ['here', 'going-back']), gte(loan.dueOn, from), lt(loan.dueOn, to)))
		.orderBy(asc(loan.dueOn));
