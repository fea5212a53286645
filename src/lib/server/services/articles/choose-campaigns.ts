import { after } from '../../../domain/articles/stage';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignsChoice } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as audit from '../../db/queries/audit';
import * as campaigns from '../../db/queries/campaign-choice';
import { takeApprovalOff } from './save-revision';
import { takeArticle, type TakeReason } from './take-article';

/** Binds an article to other campaigns. Of an approved article it takes the approval off, as a change of text does. */
export const chooseCampaigns = (
	ctx: Context,
	slug: string,
	input: CampaignsChoice
): Promise<Outcome<{ version: number }, TakeReason | 'invalid'>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.edit',
			move: 'edit',
			seen: input.version
		});
		if (!taken.ok) return taken;
		const row = taken.value;
		const wanted = [...new Set(input.campaigns)];
		const found = new Map((await campaigns.idsOf(tx, wanted)).map((one) => [one.slug, one.id]));
		const ids = wanted.flatMap((name) => found.get(name) ?? []);
		if (ids.length < wanted.length)
			return refuse('invalid', 'One of the campaigns does not exist any more.', {
				fields: { campaigns: ['One of these campaigns does not exist any more. Choose again.'] }
			});
		const before = (await articles.campaignsOf(tx, row.id)).map((one) => one.slug);
		if (before.join('\n') === wanted.join('\n')) return done({ version: row.version });
		await articles.setCampaigns(tx, row.id, ids);
		await articles.update(tx, row.id, row.version, {
			stage: after(row.stage, 'edit') ?? row.stage,
			approvedEditionId: null,
			updatedAt: ctx.now
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'article.bind',
				subjectKind: 'article',
				subjectId: row.id,
				before: { campaigns: before },
				after: { campaigns: wanted }
			}
		]);
		if (row.approvedEditionId !== null) await takeApprovalOff(ctx, tx, row, null);
		return done({ version: row.version + 1 });
	});
