import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as plans from '../../db/queries/campaign-plan';

export interface PlanOffer {
	rigs: Awaited<ReturnType<typeof plans.rigChoices>>;
	/** Null until one is chosen. */
	rig: PlanOffer['rigs'][number] | null;
	profiles: Awaited<ReturnType<typeof plans.profileChoices>>;
	workloads: Awaited<ReturnType<typeof plans.workloadChoices>>;
}

/** What a new campaign can be made of; profiles and workloads once a rig is chosen. */
export async function offerPlan(ctx: Context, rigRef: string): Promise<Outcome<PlanOffer>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only a tester plans campaigns.');
	const rigs = await plans.rigChoices(ctx.db);
	const rig = rigs.find((row) => row.slug === rigRef) ?? (rigs.length === 1 ? (rigs[0] ?? null) : null);
	if (!rig) return done({ rigs, rig, profiles: [], workloads: [] });
	const [profiles, workloads] = await Promise.all([
		plans.profileChoices(ctx.db, rig.id),
		plans.workloadChoices(ctx.db)
	]);
	return done({ rigs, rig, profiles, workloads });
}
