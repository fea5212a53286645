import { after } from '../../../domain/articles/stage';
import { blocking } from '../../../domain/articles/preflight/all-checks';
import type { Finding } from '../../../domain/articles/preflight/finding';
import * as mails from '../../../domain/mail/article-handover';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PlainMove } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction, type Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as editions from '../../db/queries/edition';
import * as handover from '../../db/queries/handover';
import * as parts from '../../db/queries/part-ids';
import * as revisions from '../../db/queries/revision';
import { freezeEdition, type FrozenEdition } from '../../rendering/freeze-edition';
import type { ArticleData } from '../../../domain/articles/data';
import { checkText, currentData, stopWords } from './check-article';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tell } from './tell';

/** Writes what was frozen as the article's next edition. */
async function write(
	ctx: Context,
	tx: Transaction,
	row: ArticleRow,
	revisionId: number,
	frozen: FrozenEdition,
	data: ArticleData,
	source: string
): Promise<{ id: number; number: number }> {
	const [author] = await handover.personById(tx, row.authorId);
	return editions.insert(
		tx,
		{
			articleId: row.id,
			revisionId,
			title: row.title,
			standfirst: row.standfirst,
			source,
			data: JSON.stringify(data),
			page: frozen.page,
			plain: frozen.plain,
			authorName: author?.name ?? '',
			testerNames: frozen.testerNames,
			hash: frozen.hash,
			approvedBy: ctx.actor.id,
			approvedAt: ctx.now
		},
		{
			plates: frozen.plates,
			results: frozen.results,
			partIds: await parts.ofSlugs(tx, frozen.partSlugs)
		}
	);
}

/**
 * Approves the newest revision, never one's own, and freezes it as an edition: source, data, page, plates, results
 * and hash, in the transaction that moves the article. Refused while anything blocks, naming it; the findings come
 * as `detail`.
 */
export const approveArticle = (
	ctx: Context,
	slug: string,
	{ version }: PlainMove
): Promise<Outcome<{ row: ArticleRow; edition: number }, TakeReason | 'invalid'>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.approve',
			move: 'approve',
			seen: version
		});
		if (!taken.ok) return taken;
		const row = taken.value;
		const head = await revisions.byNumber(tx, row.id, row.head);
		if (!head) throw new Error(`Article ${row.id} has no revision ${row.head}.`);
		const data = await currentData(ctx, tx, row.id);
		const { title, standfirst } = row;
		const frozen = freezeEdition({ slug, title, standfirst, source: head.source, data });
		const stops: Finding[] = blocking(
			await checkText(ctx, tx, row, head.source, frozen.facts, data, row.slotAt)
		);
		if (stops.length > 0)
			return refuse('invalid', stopWords('It cannot be approved yet.', stops), { detail: stops });
		const edition = await write(ctx, tx, row, head.id, frozen, data, head.source);
		const moved = await moveTo(ctx, tx, row, {
			act: 'article.approve',
			stage: after(row.stage, 'approve'),
			change: { approvedEditionId: edition.id },
			log: { edition: edition.number, hash: frozen.hash }
		});
		await tell(ctx, tx, row, `approved.e${edition.id}`, [
			{
				to: await handover.personById(tx, row.authorId),
				letter: (facts) => mails.approved(facts, edition.number)
			}
		]);
		return done({ row: moved, edition: edition.number });
	});
