import { plateCsv } from '../../../domain/articles/plates/numbers';
import { renderArticle } from '../../../domain/articles/render-article';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as revisions from '../../db/queries/revision';
import { plateDrawing } from '../../rendering/plate-cache';
import { screenSvg, type Look, type Screen } from '../../rendering/screen-svg';
import { standaloneSvg } from '../../rendering/standalone-svg';
import { currentData } from './check-article';

/** Which file of a plate: its numbers, its drawing, or the drawing set for a screen. */
export interface PlateFile {
	key: string;
	kind: 'svg' | 'csv';
	screen?: { screen: Screen; look: Look };
}

/** A plate of a text that is not printed yet, as a file: the one the newest revision draws from the bench as it is now. */
export async function readDraftPlate(
	ctx: Context,
	slug: string,
	{ key, kind, screen }: PlateFile
): Promise<Outcome<string, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	const head = found && (await revisions.byNumber(ctx.db, found.article.id, found.article.head));
	if (!found || !head) return refuse('not_found', 'There is no such article.');
	const data = await currentData(ctx, ctx.db, found.article.id);
	const plate = renderArticle(head.source, data, () => '').plates.find((one) => one.key === key);
	if (!plate)
		return refuse(
			'not_found',
			'The saved text has no such plate, or its figures have changed. Save the text and open the plate again.'
		);
	if (kind === 'csv') return done(plateCsv(plate.spec));
	const drawing = plateDrawing(plate.spec);
	return done(screen ? screenSvg(plate.spec, drawing, screen) : standaloneSvg(drawing));
}
