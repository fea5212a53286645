import type {
	ArticleData,
	CampaignData,
	KitLine,
	ProfileFacts,
	SampleDuty
} from '../../../domain/articles/data';
import { summariseCampaign } from '../../../domain/bench/campaign';
import { driftFacts } from '../../../domain/bench/drift-facts';
import type { WorkloadFacts } from '../../../domain/bench/figures';
import { defaultBaseline, matrixOf } from '../../../domain/bench/matrix';
import { chainTo } from '../../../domain/bench/profile';
import { profileReading, type LabKnowledge } from '../../../domain/bench/tuning/lab-reading';
import type { Context } from '../../context';
import * as facts from '../../db/queries/campaign-facts';
import * as recorded from '../../db/queries/campaign-readings';
import * as duties from '../../db/queries/sample-duties';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as terms from '../../db/queries/glossary-term';
import * as ladders from '../../db/queries/ladder';
import * as stock from '../../db/queries/stock-runs';
import { publication } from '../../db/queries/settings';
import * as stability from '../../db/queries/stability-facts';
import * as sweeps from '../../db/queries/sweep';

function kitOf(rows: facts.KitRow[]): KitLine[] {
	return rows.map(({ part, maker, model, kind, sample, provenance, price }) => ({
		part,
		partName: `${maker} ${model}`,
		kind,
		sample,
		provenance,
		price
	}));
}

function profilesOf(
	{ profiles, rigProfiles, rigSettings }: facts.CampaignFacts,
	lab: LabKnowledge
): ProfileFacts[] {
	return profiles.map(({ id, slug, name, parentId, notes }) => {
		const chain = chainTo(rigProfiles, id).map((one) => ({
			settings: rigSettings.filter((setting) => setting.profileId === one.id)
		}));
		const parent = rigProfiles.find((one) => one.id === parentId)?.slug ?? null;
		return { slug, name, parent, notes, ...profileReading(chain, lab) };
	});
}

const workloadOf = (row: facts.CampaignWorkloadRow): WorkloadFacts => ({
	slug: row.slug,
	name: row.name,
	programVersion: row.programVersion,
	settings: row.settings,
	quantity: row.quantity,
	unit: row.unit,
	better: row.better,
	class: row.class,
	headline: row.headline,
	leastDifferencePercent: row.leastDifferencePercent,
	warmUps: row.warmUps,
	repeats: row.repeats,
	coolDownS: row.coolDownS
});

function campaignOf(
	plan: facts.CampaignFacts,
	own: recorded.CampaignReadings,
	lab: LabKnowledge
): CampaignData {
	const { head } = plan;
	const baseline = defaultBaseline(plan.profiles);
	const figures =
		baseline === null ? { cells: [], overall: {} } : summariseCampaign(matrixOf(plan, own, baseline));
	return {
		slug: head.slug,
		name: head.name,
		rig: {
			slug: head.rigSlug,
			name: head.rigName,
			revision: head.revision,
			firmware: head.firmware,
			driver: head.driver,
			os: head.os
		},
		kit: kitOf(plan.kit),
		profiles: profilesOf(plan, lab),
		workloads: plan.workloads.map(workloadOf),
		baseline: baseline ?? '',
		...figures
	};
}

function dutyOf({
	slug,
	maker,
	model,
	provenance,
	disclosures,
	embargoes
}: duties.SampleDutyRow): SampleDuty {
	const agreed = disclosures.filter((text) => text.trim() !== '');
	return {
		sample: slug,
		partName: `${maker} ${model}`,
		provenance,
		// The terms of the latest loan stand.
		disclosure: agreed.at(-1) ?? null,
		embargoes: embargoes.map(({ field, until }) => ({ field, until: until.toISOString() }))
	};
}

/** What was climbed and swept on the rigs of the campaigns, without what was put away. */
async function stabilityOf(db: Context['db'], rigIds: number[]) {
	const [climbed, swept] = await Promise.all([ladders.ofRigs(db, rigIds), sweeps.ofRigs(db, rigIds)]);
	const standing = <T extends { archivedAt: Date | null }>(rows: T[]) =>
		rows.filter((row) => row.archivedAt === null);
	const [allLadders, allSweeps] = await Promise.all([
		stability.ofLadders(db, standing(climbed)),
		stability.ofSweeps(db, standing(swept))
	]);
	return {
		ladders: allLadders.map(({ facts: ladder }) => ladder),
		sweeps: allSweeps.map(({ facts: sweep }) => sweep)
	};
}

/**
 * Everything an article's directives may name, of the campaigns it is bound to, in the order given. The number
 * of queries does not depend on how much was measured. The service that asks has checked that its actor may.
 */
export async function articleData(
	{ db, now }: Pick<Context, 'db' | 'now'>,
	campaignIds: number[]
): Promise<ArticleData> {
	const [plans, readings, { zone }, glossary] = await Promise.all([
		facts.forCampaigns(db, campaignIds),
		recorded.forCampaigns(db, campaignIds),
		publication(db),
		terms.standing(db)
	]);
	const revisions = [...new Set(plans.map(({ head }) => head.rigRevisionId))];
	const rigIds = [...new Set(plans.map(({ head }) => head.rigId))];
	const [rows, climbedAndSwept, stockRuns, labOf] = await Promise.all([
		duties.ofRigRevisions(db, revisions, now),
		stabilityOf(db, rigIds),
		stock.ofRigs(db, { rigs: rigIds }),
		knowledge.ofRigs(db, rigIds)
	]);
	const ordered = campaignIds.flatMap((id) => plans.find(({ head }) => head.id === id) ?? []);
	return {
		campaigns: ordered.map((plan) =>
			campaignOf(plan, readings.get(plan.head.id) ?? { runs: [], signatures: [] }, labOf(plan.head.rigId))
		),
		duties: rows.map(dutyOf),
		...climbedAndSwept,
		drifts: driftFacts(stockRuns),
		glossary,
		zone
	};
}
