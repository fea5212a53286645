import type { ArticleData } from '../../../domain/articles/data';
import { renderArticle } from '../../../domain/articles/render-article';
import {
	aroundChanges,
	comparePages,
	type ShownBlock
} from '../../../domain/articles/revisions/compare-pages';
import { putDrawings, takeDrawings } from '../../../domain/articles/revisions/plate-drawings';
import type { Side } from '../../../schemas/article';
import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { ArticleRow } from '../../db/queries/article';
import * as editions from '../../db/queries/edition';
import * as revisions from '../../db/queries/revision';
import { pageTree } from '../../rendering/page-tree';
import { plateDrawing } from '../../rendering/plate-cache';
import { sanitiseComparison, sanitisePage } from '../../rendering/sanitise-page';
import { currentData } from './check-article';
import { withPictures } from './known-pictures';

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

/** A page without the drawings of its plates, and where to have those. */
interface BarePage {
	html: string;
	drawing: (key: string) => string | undefined;
}

async function pageOf(
	ctx: Context,
	row: ArticleRow,
	text: ComparedText,
	data: ArticleData
): Promise<BarePage> {
	if (text.page !== null) {
		const { page, drawings } = takeDrawings(text.page);
		return { html: page, drawing: (key) => drawings.get(key) };
	}
	const known = await withPictures(ctx.db, data, text.source);
	const { html, plates } = renderArticle(text.source, known, () => '', {
		platesAt: `/desk/articles/${row.slug}/plates/`
	});
	const specs = new Map(plates.map(({ key, spec }) => [key, spec]));
	const drawing = (key: string) => {
		const spec = specs.get(key);
		return spec && plateDrawing(spec);
	};
	return { html: sanitisePage(html), drawing };
}

/**
 * The pages of two texts, block by block, with what changed marked in them. Only the plates that are shown are drawn:
 * of a long article with thirty of them that is seconds of the server's time.
 */
export async function compareOnPage(
	ctx: Context,
	row: ArticleRow,
	{ before, after }: { before: ComparedText; after: ComparedText },
	all: boolean
): Promise<{ blocks: ShownBlock[]; changes: number }> {
	const data = await currentData(ctx, ctx.db, row.id);
	const [was, is] = await Promise.all([pageOf(ctx, row, before, data), pageOf(ctx, row, after, data)]);
	const compared = comparePages(pageTree(was.html), pageTree(is.html));
	const shown = all ? compared : aroundChanges(compared);
	const blocks = shown.map((block): ShownBlock => {
		if (block.state === 'skipped') return block;
		const drawn = putDrawings(block.html, (key) => is.drawing(key) ?? was.drawing(key));
		return { ...block, html: sanitiseComparison(drawn) };
	});
	return { blocks, changes: compared.filter(({ state }) => state !== 'same').length };
}
