import { done, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignArchive, CampaignEdit } from '../../../schemas/campaign';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import { changePlan } from './change-plan';
import { endOfDay } from './read-started';

/** Says name, purpose and due date differently. */
export async function editCampaign(
	ctx: Context,
	campaignRef: string,
	input: CampaignEdit
): Promise<Outcome<{ slug: string }>> {
	const { zone } = await settings.publication(ctx.db);
	const row = { name: input.name, purpose: input.purpose, dueAt: endOfDay(input.dueOn, zone) };
	return changePlan(ctx, campaignRef, input.version, (_tx, { head }) =>
		Promise.resolve(
			done({
				act: 'campaign.edit',
				row,
				before: { name: head.name, purpose: head.purpose, dueAt: head.dueAt },
				after: row
			})
		)
	);
}

/** Puts a campaign away, or takes it out again. Its data stay as they are. */
export const archiveCampaign = (
	ctx: Context,
	campaignRef: string,
	input: CampaignArchive
): Promise<Outcome<{ slug: string }>> =>
	changePlan(
		ctx,
		campaignRef,
		input.version,
		(_tx, { head }) =>
			Promise.resolve(
				done({
					act: 'campaign.archive',
					row: { archivedAt: input.archived === 'yes' ? (head.archivedAt ?? ctx.now) : null },
					before: { archived: head.archivedAt !== null },
					after: { archived: input.archived === 'yes' }
				})
			),
		{ archivedToo: true }
	);
