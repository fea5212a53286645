import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RevisionRestore } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as revisions from '../../db/queries/revision';
import { saveRevisionIn, type Saved } from './save-revision';

/** Saves the text of an old revision as the newest; the ones between stay. */
export const restoreRevision = (
	ctx: Context,
	slug: string,
	{ number, basedOn }: RevisionRestore
): Promise<Outcome<Saved, 'not_found' | 'forbidden' | 'conflict'>> =>
	inTransaction(ctx.db, async (tx) => {
		const row = await articles.lockBySlug(tx, slug);
		if (!row) return refuse('not_found', 'There is no such article.');
		const old = await revisions.byNumber(tx, row.id, number);
		if (!old) return refuse('not_found', 'There is no such revision of this article.');
		const { title, standfirst, source } = old;
		return saveRevisionIn(
			ctx,
			tx,
			slug,
			{ title, standfirst, source, basedOn },
			`restored from revision ${number}`
		);
	});
