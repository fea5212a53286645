import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as plans from '../../db/queries/campaign-plan';

export interface StabilityOffer {
	rigs: Awaited<ReturnType<typeof plans.rigChoices>>;
	/** Null until one is chosen. */
	rig: StabilityOffer['rigs'][number] | null;
	profiles: Awaited<ReturnType<typeof plans.profileChoices>>;
	workloads: Awaited<ReturnType<typeof plans.workloadChoices>>;
}

/** What a new ladder or sweep can be made of; the profiles once a rig is chosen. */
export async function offerStability(
	ctx: Context,
	rigRef: string
): Promise<Outcome<StabilityOffer, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers begin ladders and sweeps.');
	const [rigs, workloads] = await Promise.all([plans.rigChoices(ctx.db), plans.workloadChoices(ctx.db)]);
	const rig = rigs.find((row) => row.slug === rigRef) ?? (rigs.length === 1 ? (rigs[0] ?? null) : null);
	const profiles = rig ? await plans.profileChoices(ctx.db, rig.id) : [];
	return done({ rigs, rig, profiles, workloads });
}
