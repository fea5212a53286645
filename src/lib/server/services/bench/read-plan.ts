import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { CampaignHead } from '../../db/queries/campaign-facts';
import * as instruments from '../../db/queries/instrument';
import * as plans from '../../db/queries/campaign-plan';
import * as settings from '../../db/queries/settings';
import { findCampaign } from './find-campaign';

export interface PlanRow {
	slug: string;
	name: string;
	/** Runs in it, voided ones included; with one it cannot be removed. */
	runs: number;
}

export interface ReadPlan {
	head: CampaignHead;
	profiles: PlanRow[];
	/** With the slug of the instrument its figures are read from; empty for the program itself. */
	workloads: (PlanRow & { unit: string; needed: number; instrument: string })[];
	/** To name: those in use, and those that a column names already. */
	instruments: Awaited<ReturnType<typeof instruments.all>>;
	/** ISO day in the publication's zone, by which a calibration is overdue. */
	today: string;
	/** What could be added. */
	moreProfiles: Awaited<ReturnType<typeof plans.profileChoices>>;
	moreWorkloads: Awaited<ReturnType<typeof plans.workloadChoices>>;
	/** The due day in the publication's zone; empty for none. */
	dueOn: string;
}

/** A campaign's plan as its tester changes it. */
export async function readPlan(ctx: Context, campaignRef: string): Promise<Outcome<ReadPlan>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only a tester changes the plan.');
	const found = await findCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { head, profiles, workloads } = found.value;
	const [counts, offeredProfiles, offeredWorkloads, named, all, { zone }] = await Promise.all([
		plans.runCounts(ctx.db, head.id),
		plans.profileChoices(ctx.db, head.rigId),
		plans.workloadChoices(ctx.db),
		instruments.ofCampaign(ctx.db, head.id),
		instruments.all(ctx.db),
		settings.publication(ctx.db)
	]);
	const runsOf = (of: (row: (typeof counts)[number]) => boolean) =>
		counts.filter(of).reduce((sum, row) => sum + row.runs, 0);
	return done({
		head,
		profiles: profiles.map(({ id, slug, name }) => ({
			slug,
			name,
			runs: runsOf((row) => row.profileId === id)
		})),
		workloads: workloads.map(({ id, slug, name, unit, needed }) => ({
			slug,
			name,
			unit,
			needed,
			instrument: named.find((one) => one.workloadId === id)?.slug ?? '',
			runs: runsOf((row) => row.workloadId === id)
		})),
		instruments: all.filter((one) => !one.retiredAt || named.some((use) => use.slug === one.slug)),
		today: DateTime.fromJSDate(ctx.now).setZone(zone).toISODate() ?? '',
		moreProfiles: offeredProfiles.filter((row) => !profiles.some((one) => one.id === row.id)),
		moreWorkloads: offeredWorkloads.filter((row) => !workloads.some((one) => one.id === row.id)),
		dueOn: head.dueAt ? (DateTime.fromJSDate(head.dueAt).setZone(zone).toISODate() ?? '') : ''
	});
}
