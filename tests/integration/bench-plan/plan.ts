import type { Outcome } from '../../../src/lib/domain/shared/outcome';
import { partInput } from '../../../src/lib/schemas/part';
import { profileInput, type ProfileTyped } from '../../../src/lib/schemas/profile';
import { rigInput, type RigTyped } from '../../../src/lib/schemas/rig';
import { sampleInput } from '../../../src/lib/schemas/sample';
import { workloadInput, type WorkloadTyped } from '../../../src/lib/schemas/workload';
import { campaignInput } from '../../../src/lib/schemas/campaign';
import { runInput } from '../../../src/lib/schemas/run';
import type { Context } from '../../../src/lib/server/context';
import { planCampaign } from '../../../src/lib/server/services/bench/plan-campaign';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { createProfile } from '../../../src/lib/server/services/bench-plan/create-profile';
import { createRig } from '../../../src/lib/server/services/bench-plan/create-rig';
import { createWorkload } from '../../../src/lib/server/services/bench-plan/create-workload';
import { createPart } from '../../../src/lib/server/services/stores/create-part';
import { createSample } from '../../../src/lib/server/services/stores/create-sample';

/** The value of what must not be refused here. */
export async function must<T>(outcome: Promise<Outcome<T>>): Promise<T> {
	const result = await outcome;
	if (!result.ok) throw new Error(`${result.reason}: ${result.message} ${JSON.stringify(result.fields)}`);
	return result.value;
}

export const aldermoor = { kind: 'processor', maker: 'Aldermoor', model: '1650' } as const;

export const tileRender: WorkloadTyped = {
	name: 'Tile render',
	quantity: 'time',
	unit: 's',
	better: 'lower',
	class: 'all-core',
	leastDifferencePercent: 1
};

export const addPart = (ctx: Context, more: object = {}) =>
	must(createPart(ctx, partInput.parse({ ...aldermoor, ...more })));
export const addSample = (ctx: Context, more: object = {}) =>
	must(createSample(ctx, sampleInput.parse({ part: 'aldermoor-1650', provenance: 'bought', ...more })));
export const addWorkload = (ctx: Context, more: object = {}) =>
	must(createWorkload(ctx, workloadInput.parse({ ...tileRender, ...more })));
export const addProfile = (ctx: Context, typed: Omit<ProfileTyped, 'rig'>) =>
	must(createProfile(ctx, profileInput.parse({ rig: 'n-12', ...typed })));

/** A rig of one sample. */
export async function addRig(ctx: Context, more: Partial<RigTyped> = {}) {
	await addPart(ctx);
	const sample = await addSample(ctx);
	return must(
		createRig(ctx, rigInput.parse({ name: 'N-12', samples: [sample.slug], firmware: '2.14', ...more }))
	);
}

/** Plans a campaign and records one run in it, so that all it is made of counts as measured. */
export async function measure(ctx: Context, profile = 'stock', workload = 'tile-render') {
	const plan = { name: `Look at ${profile}`, rig: 'n-12', profiles: [profile], workloads: [{ workload }] };
	const campaign = await must(planCampaign(ctx, campaignInput.parse(plan)));
	const run = { workload, profile, unit: 's', readings: [31.2, 31.4] };
	await must(recordRun(ctx, campaign.slug, runInput.parse(run)));
	return campaign;
}
