import type { CampaignMatrix, CampaignReading, CampaignRun } from './campaign';
import type { WorkloadFacts } from './figures';

interface PlannedProfile {
	slug: string;
	/** Null for stock, the root of the rig's profiles. */
	parentId: number | null;
}

interface RecordedRun {
	profile: string;
	workload: string;
	tester: string;
	startedAt: Date;
	ambientC: number | null;
	voidedAt: Date | null;
	readings: { id: number; value: number; excludedAt: Date | null }[];
}

interface RecordedSignature {
	profile: string;
	workload: string;
	signedBy: string;
	signedAt: Date;
}

/** A reading that still knows its row. */
export interface StoredReading extends CampaignReading {
	id: number;
}

export interface StoredMatrix extends CampaignMatrix {
	runs: CampaignRun<StoredReading>[];
}

/** The profile the others are held against when nobody names one: stock, or the first where stock is not measured. */
export function defaultBaseline(profiles: readonly PlannedProfile[]): string | null {
	return (profiles.find((profile) => profile.parentId === null) ?? profiles[0])?.slug ?? null;
}

/**
 * A stored campaign as the matrix its figures are computed from.
 * RangeError for a campaign without profiles, which has no baseline.
 */
export function matrixOf(
	plan: { profiles: readonly PlannedProfile[]; workloads: readonly (WorkloadFacts & { needed: number })[] },
	recorded: { runs: readonly RecordedRun[]; signatures: readonly RecordedSignature[] },
	baseline: string | null = defaultBaseline(plan.profiles)
): StoredMatrix {
	if (baseline === null) throw new RangeError('A campaign without profiles has no baseline.');
	return {
		baseline,
		profiles: plan.profiles.map((profile) => profile.slug),
		workloads: [...plan.workloads],
		runs: recorded.runs.map((run) => ({
			profile: run.profile,
			workload: run.workload,
			tester: run.tester,
			startedAt: run.startedAt.toISOString(),
			ambientC: run.ambientC,
			voided: run.voidedAt !== null,
			readings: run.readings.map((reading) => ({
				id: reading.id,
				value: reading.value,
				excluded: reading.excludedAt !== null
			}))
		})),
		signatures: recorded.signatures.map((signature) => ({
			profile: signature.profile,
			workload: signature.workload,
			signedBy: signature.signedBy,
			signedAt: signature.signedAt.toISOString()
		}))
	};
}
