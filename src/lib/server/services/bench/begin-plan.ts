import { refuse, done, type Outcome } from '../../../domain/shared/outcome';
import type { PlanBeginning } from '../../../schemas/campaign';
import type { Context } from '../../context';
import * as suites from '../../db/queries/suite';
import { findCampaign } from './find-campaign';

export interface Beginning extends PlanBeginning {
	kind: 'campaign' | 'suite';
	/** Of what it is copied from. */
	slug: string;
	title: string;
	/** The rig it was on and the revision it measured; null for a suite, which stands for any rig. */
	rig: { slug: string; revision: number } | null;
}

async function fromCampaign(ctx: Context, ref: string): Promise<Outcome<Beginning, 'not_found'>> {
	const found = await findCampaign(ctx, ref);
	if (!found.ok) return found;
	const { head, profiles, workloads } = found.value;
	return done({
		kind: 'campaign',
		slug: head.slug,
		title: head.name,
		rig: { slug: head.rigSlug, revision: head.revision },
		name: `${head.name}, again`.slice(0, 160),
		purpose: head.purpose,
		profiles: profiles.map((row) => row.slug),
		workloads: workloads.map((row) => ({ slug: row.slug, repeats: row.needed }))
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
		workloads: workloads.map(({ slug, repeats }) => ({ slug, repeats }))
	});
}

/** What a new plan begins with: another campaign's rows and columns, a suite's columns, or nothing. Never readings. */
export async function beginPlan(
	ctx: Context,
	{ from, suite }: { from: string; suite: string }
): Promise<Outcome<Beginning | null, 'not_found'>> {
	if (from !== '') return fromCampaign(ctx, from);
	return suite === '' ? done(null) : fromSuite(ctx, suite);
}
