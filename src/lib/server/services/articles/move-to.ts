import type { Stage } from '../../../domain/articles/stage';
import type { SystemContext } from '../../context';
import type { Transaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import type { ArticleRow } from '../../db/queries/article';
import * as audit from '../../db/queries/audit';

/** What a move does to a locked article. */
export interface Step {
	/** As the log calls it. */
	act: string;
	/** Null where the stage table has no such move: a bug, because the move was checked when the row was taken. */
	stage: Stage | null;
	change?: Partial<ArticleRow>;
	reason?: string | null;
	/** More for the log than stage and slot. */
	log?: Record<string, unknown>;
}

/** Writes a move of a locked article and its line in the log; returns the row as it is now. */
export async function moveTo(
	ctx: SystemContext & { actor?: { id: string } },
	tx: Transaction,
	row: ArticleRow,
	{ act, stage, change = {}, reason = null, log = {} }: Step
): Promise<ArticleRow> {
	if (!stage) throw new Error(`${act} is no move of an article that is ${row.stage}.`);
	const next = { ...change, stage, updatedAt: ctx.now };
	if (!(await articles.update(tx, row.id, row.version, next)))
		throw new Error(`Article ${row.id} changed under its lock.`);
	const moved = { ...row, ...next, version: row.version + 1 };
	await audit.append(tx, [
		{
			at: ctx.now,
			actorId: ctx.actor?.id ?? null,
			act,
			subjectKind: 'article',
			subjectId: row.id,
			before: { stage: row.stage, slotAt: row.slotAt },
			after: { stage, slotAt: moved.slotAt, revision: row.head, ...log },
			reason
		}
	]);
	return moved;
}
