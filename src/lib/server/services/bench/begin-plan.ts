import { DateTime } from 'luxon';
import { calibrationState, calibrationWords } from '../../../domain/bench/calibration';
import { refuse, done, type Outcome } from '../../../domain/shared/outcome';
import type { PlanBeginning } from '../../../schemas/campaign';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as instruments from '../../db/queries/instrument';
import * as settings from '../../db/queries/settings';
import * as suites from '../../db/queries/suite';
import { findCampaign } from './find-campaign';

export interface Beginning extends PlanBeginning {
	kind: 'campaign' | 'suite';
	/** Of what it is copied from. */
	slug: string;
	title: string;
	/** The rig it was on and the revision it measured; null for a suite, which stands for any rig. */
	rig: { slug: string; revision: number } | null;
	/** What its columns were read from and are read from again, with what is to be said where a calibration lapsed. */
	instruments: { workload: string; slug: string; name: string; lapsed: string | null }[];
	/** What they were read from and is no longer in use, so that it is not carried. */
	retired: { workload: string; name: string }[];
}

/** The instruments of a campaign's columns: those in use, and those that are not any more. */
async function instrumentsOf(ctx: Context, { head, workloads }: CampaignPlan) {
	const [named, { zone }] = await Promise.all([
		instruments.ofCampaign(ctx.db, head.id),
		settings.publication(ctx.db)
	]);
	const today = DateTime.fromJSDate(ctx.now).setZone(zone).toISODate() ?? '';
	const rows = workloads.flatMap((workload) => {
		const one = named.find((row) => row.workloadId === workload.id);
		return one ? [{ workload, one }] : [];
	});
	return {
		instruments: rows
			.filter(({ one }) => one.retiredAt === null)
			.map(({ workload, one }) => ({
				workload: workload.slug,
				slug: one.slug,
				name: one.name,
				lapsed: calibrationState(one, today) === 'overdue' ? calibrationWords(one, today) : null
			})),
		retired: rows
			.filter(({ one }) => one.retiredAt !== null)
			.map(({ workload, one }) => ({ workload: workload.name, name: one.name }))
	};
}

async function fromCampaign(ctx: Context, ref: string): Promise<Outcome<Beginning, 'not_found'>> {
	const found = await findCampaign(ctx, ref);
	if (!found.ok) return found;
	const { head, profiles, workloads } = found.value;
	const read = await instrumentsOf(ctx, found.value);
	return done({
		kind: 'campaign',
		slug: head.slug,
		title: head.name,
		rig: { slug: head.rigSlug, revision: head.revision },
		name: `${head.name}, again`.slice(0, 160),
		purpose: head.purpose,
		profiles: profiles.map((row) => row.slug),
		workloads: workloads.map((row) => ({
			slug: row.slug,
			repeats: row.needed,
			instrument: read.instruments.find((one) => one.workload === row.slug)?.slug ?? ''
		})),
		...read
	});
}

async function fromSuite(ctx: Context, ref: string): Promise<Outcome<Beginning, 'not_found'>> {
	const [suite] = await suites.byRefs(ctx.db, [ref]);
	if (!suite) return refuse('not_found', 'There is no such suite.');
	const workloads = await suites.workloadsOf(ctx.db, [suite.id]);
	return done({
		kind: 'suite',
		slug: suite.slug,
		title: suite.name,
		rig: null,
		name: '',
		purpose: '',
		profiles: null,
		workloads: workloads.map(({ slug, repeats }) => ({ slug, repeats })),
		instruments: [],
		retired: []
	});
}

/** What a new plan begins with: another campaign's rows and columns with their instruments, a suite's columns, or nothing. Never readings. */
export async function beginPlan(
	ctx: Context,
	{ from, suite }: { from: string; suite: string }
): Promise<Outcome<Beginning | null, 'not_found'>> {
	if (from !== '') return fromCampaign(ctx, from);
	return suite === '' ? done(null) : fromSuite(ctx, suite);
}
