import type { Finding, PageFacts } from '../../../domain/articles/preflight/finding';
import { preflight, printChecks, slotChecks } from '../../../domain/articles/preflight/all-checks';
import type { ArticleData } from '../../../domain/articles/data';
import { renderArticle } from '../../../domain/articles/render-article';
import type { SystemContext } from '../../context';
import type { Db } from '../../db/client';
import * as articles from '../../db/queries/article';
import type { ArticleRow } from '../../db/queries/article';
import * as comments from '../../db/queries/comment';
import * as editions from '../../db/queries/edition';
import { articleData } from './article-data';

/** The data of an article's campaigns as the bench has it now. */
export async function currentData(
	ctx: Pick<SystemContext, 'now'>,
	db: Db,
	articleId: number
): Promise<ArticleData> {
	const bound = await articles.campaignsOf(db, articleId);
	return articleData(
		{ db, now: ctx.now },
		bound.map((one) => one.id)
	);
}

/** What a rendered text would be stopped or advised for, if it were printed at a moment. */
export async function checkText(
	ctx: Pick<SystemContext, 'now'>,
	db: Db,
	row: ArticleRow,
	source: string,
	page: PageFacts,
	data: ArticleData,
	printAt: Date | null
): Promise<Finding[]> {
	return preflight({
		title: row.title,
		standfirst: row.standfirst,
		source,
		page,
		data,
		blockingComments: await comments.blockingOf(db, row.id),
		printAt,
		now: ctx.now
	});
}

/**
 * What stops an approved edition from going out at a moment. Its page and figures are frozen and are not judged
 * again; embargoes, disclosures and, where people ask, the editors' comments are looked at as they stand now.
 */
export async function checkEdition(
	ctx: Pick<SystemContext, 'now'>,
	db: Db,
	row: ArticleRow,
	printAt: Date,
	who: 'person' | 'schedule'
): Promise<Finding[]> {
	if (row.approvedEditionId === null) return [];
	const frozen = await editions.byId(db, row.approvedEditionId);
	if (!frozen) throw new Error(`Article ${row.id} has no edition ${row.approvedEditionId}.`);
	const then = JSON.parse(frozen.data) as ArticleData;
	const { duties } = await currentData(ctx, db, row.id);
	const page = renderArticle(frozen.source, then, () => '');
	return preflight(
		{
			title: frozen.title,
			standfirst: frozen.standfirst,
			source: frozen.source,
			page,
			data: { ...then, duties },
			blockingComments: await comments.blockingOf(db, row.id),
			printAt,
			now: ctx.now
		},
		who === 'person' ? printChecks : slotChecks
	).filter((finding) => finding.severity === 'blocking');
}

/** Findings as one refusal's words: how many, and each with what mends it. */
export const stopWords = (what: string, findings: Finding[]): string =>
	`${what} ${findings.map((finding) => finding.message).join(' ')} Nothing was changed.`;
