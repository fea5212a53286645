import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { CampaignInput } from '../../../schemas/campaign';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as campaigns from '../../db/queries/campaign';
import * as plans from '../../db/queries/campaign-plan';
import * as settings from '../../db/queries/settings';
import { chooseRig, chooseRows, type ChosenRows } from './choose-plan';
import { endOfDay } from './read-started';

interface Planned {
	id: number;
	slug: string;
	name: string;
}

interface Chosen extends ChosenRows {
	rig: { slug: string; revisionId: number; revision: number };
	slug: string;
	dueAt: Date | null;
}

async function write(ctx: Context, input: CampaignInput, chosen: Chosen): Promise<Planned> {
	const { name, purpose } = input;
	const { slug, dueAt, rig } = chosen;
	const id = await campaigns.insert(ctx.db, {
		slug,
		name,
		purpose,
		dueAt,
		rigRevisionId: rig.revisionId,
		createdBy: ctx.actor.id,
		createdAt: ctx.now
	});
	await plans.addProfiles(ctx.db, id, chosen.profileIds, 1);
	await plans.addWorkloads(ctx.db, id, chosen.workloads, 1);
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'campaign.plan',
			subjectKind: 'campaign',
			subjectId: id,
			after: {
				slug,
				name,
				rig: rig.slug,
				revision: rig.revision,
				profiles: input.profiles,
				workloads: input.workloads.map((row) => row.workload),
				instruments: Object.fromEntries(
					input.workloads.flatMap((row) => (row.instrument ? [[row.workload, row.instrument]] : []))
				)
			}
		}
	]);
	return { id, slug, name };
}

const taken = (slug: string) =>
	refuse('invalid', 'Another campaign has this name already. Nothing was stored.', {
		fields: { slug: [`“${slug}” is taken. Choose another short name.`] }
	});

/** Plans a campaign: a rig as it stands now, profiles of it, workloads with the readings each cell needs. */
export async function planCampaign(ctx: Context, input: CampaignInput): Promise<Outcome<Planned>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only a tester plans campaigns.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug))
		return refuse('invalid', 'The campaign needs a short name of its own. Nothing was stored.', {
			fields: { slug: ['Write a short name in letters a to z.'] }
		});
	const rig = await chooseRig(ctx.db, input.rig);
	if (!rig.ok) return rig;
	const rows = await chooseRows(ctx.db, rig.value.id, input);
	if (!rows.ok) return rows;
	const { zone } = await settings.publication(ctx.db);
	const chosen = { ...rows.value, rig: rig.value, slug, dueAt: endOfDay(input.dueOn, zone) };
	try {
		return done(await inTransaction(ctx.db, (db) => write({ ...ctx, db }, input, chosen)));
	} catch (error) {
		if (isDuplicate(error)) return taken(slug);
		throw error;
	}
}
