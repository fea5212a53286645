import type { ArticleData } from '../../../domain/articles/data';
import { comparePages, type ComparedBlock } from '../../../domain/articles/revisions/compare-pages';
import type { Side } from '../../../schemas/article';
import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { ArticleRow } from '../../db/queries/article';
import * as editions from '../../db/queries/edition';
import * as revisions from '../../db/queries/revision';
import { pageTree } from '../../rendering/page-tree';
import { sanitiseComparison } from '../../rendering/sanitise-page';
import { currentData } from './check-article';
import { withPictures } from './known-pictures';
import { renderNow } from './open-article';

/** One of two texts that are compared: a revision, or an edition as it was frozen. */
export interface ComparedText {
	kind: Side['kind'];
	number: number;
	title: string;
	standfirst: string;
	source: string;
	at: Date;
	by: string;
	label: string | null;
	/** The frozen page; a revision's is drawn from the bench as it is now. */
	page: string | null;
}

async function textOf(ctx: Context, row: ArticleRow, side: Side): Promise<ComparedText | undefined> {
	if (side.kind === 'edition') {
		const one = await editions.byNumber(ctx.db, row.id, side.number);
		return (
			one && { ...side, ...one, at: one.approvedAt, by: one.approvedByName, label: null, page: one.page }
		);
	}
	const one = await revisions.byNumber(ctx.db, row.id, side.number);
	return one && { ...side, ...one, at: one.savedAt, by: one.savedByName, page: null };
}

/** The two texts that were asked for. */
export async function textsOf(
	ctx: Context,
	row: ArticleRow,
	sides: { from: Side; to: Side }
): Promise<Outcome<{ before: ComparedText; after: ComparedText }, 'not_found'>> {
	const [before, after] = await Promise.all([textOf(ctx, row, sides.from), textOf(ctx, row, sides.to)]);
	return before && after
		? { ok: true, value: { before, after } }
		: refuse('not_found', 'There is no such revision of this article.');
}

async function pageOf(ctx: Context, row: ArticleRow, text: ComparedText, data: ArticleData): Promise<string> {
	if (text.page !== null) return text.page;
	return renderNow(row.slug, text.source, await withPictures(ctx.db, data, text.source)).html;
}

/** The pages of two texts, block by block, with what changed marked in them. */
export async function compareOnPage(
	ctx: Context,
	row: ArticleRow,
	{ before, after }: { before: ComparedText; after: ComparedText }
): Promise<ComparedBlock[]> {
	const data = await currentData(ctx, ctx.db, row.id);
	const [was, is] = await Promise.all([pageOf(ctx, row, before, data), pageOf(ctx, row, after, data)]);
	return comparePages(pageTree(was), pageTree(is)).map((block) => ({
		...block,
		html: sanitiseComparison(block.html)
	}));
}
