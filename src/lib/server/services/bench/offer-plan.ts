import { may } from '../../../domain/people/policy';
import { firstOf } from '../../../domain/shared/first-of';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as plans from '../../db/queries/campaign-plan';
import * as suites from '../../db/queries/suite';
import { beginPlan, type Beginning } from './begin-plan';

export interface PlanOffer {
	rigs: Awaited<ReturnType<typeof plans.rigChoices>>;
	/** Null until one is chosen. */
	rig: PlanOffer['rigs'][number] | null;
	/** Those of what it begins with come first, in their order. */
	profiles: Awaited<ReturnType<typeof plans.profileChoices>>;
	workloads: Awaited<ReturnType<typeof plans.workloadChoices>>;
	suites: Awaited<ReturnType<typeof suites.choices>>;
	begin: Beginning | null;
}

export interface PlanAsked {
	/** Slug of the rig; empty where none is chosen yet. */
	rig: string;
	/** Slug of the campaign or the suite that it begins with; empty for none. */
	from: string;
	suite: string;
}

/** What a new campaign can be made of; profiles and workloads once a rig is chosen. */
export async function offerPlan(ctx: Context, asked: PlanAsked): Promise<Outcome<PlanOffer>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only a tester plans campaigns.');
	const begun = await beginPlan(ctx, asked);
	if (!begun.ok) return begun;
	const begin = begun.value;
	const [rigs, offeredSuites] = await Promise.all([plans.rigChoices(ctx.db), suites.choices(ctx.db)]);
	const wanted = asked.rig || begin?.rig?.slug;
	const rig = rigs.find((row) => row.slug === wanted) ?? (rigs.length === 1 ? (rigs[0] ?? null) : null);
	const offer = { rigs, rig, suites: offeredSuites, begin };
	if (!rig) return done({ ...offer, profiles: [], workloads: [] });
	const [profiles, workloads] = await Promise.all([
		plans.profileChoices(ctx.db, rig.id),
		plans.workloadChoices(ctx.db)
	]);
	// Profiles are those of their rig, whatever they are called on another.
	const ownRig = begin?.rig?.slug === rig.slug;
	const slugs = begin?.workloads.map((row) => row.slug) ?? [];
	return done({
		...offer,
		begin: begin && { ...begin, profiles: ownRig ? begin.profiles : null },
		profiles: firstOf(profiles, (ownRig && begin?.profiles) || []),
		workloads: firstOf(workloads, slugs)
	});
}
