import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import { openMoves } from '../../../domain/stores/loan';
import type { Context } from '../../context';
import * as audit from '../../db/queries/audit';
import * as embargoes from '../../db/queries/embargo';
import * as loans from '../../db/queries/loan';
import { publication } from '../../db/queries/settings';
import * as usage from '../../db/queries/sample-usage';

/** A loan with its samples, embargoes, history, and the articles that use the samples: their title, stage and slot, never their text. */
export async function readLoan(ctx: Context, id: number) {
	if (!may(ctx.actor, 'loan.read')) return refuse('forbidden', 'Loans are the liaison’s.');
	const found = await loans.byId(ctx.db, id);
	if (!found) return refuse('not_found', 'There is no such loan.');
	const samples = await loans.samplesOf(ctx.db, [id]);
	const [{ zone }, articles, terms, history] = await Promise.all([
		publication(ctx.db),
		usage.articlesOf(
			ctx.db,
			samples.map((s) => s.sampleId)
		),
		embargoes.ofLoan(ctx.db, id),
		audit.ofSubject(ctx.db, 'loan', id)
	]);
	const once = [
		...new Map(articles.map(({ sampleId: _, ...article }) => [article.articleId, article])).values()
	];
	return done({
		...found,
		samples,
		embargoes: terms,
		history,
		articles: once,
		moves: openMoves(found.loan.stage),
		zone,
		now: ctx.now
	});
}
