import type { CampaignMatrix, CampaignRun } from './campaign';
import type { WorkloadFacts } from './figures';

/** A run of any campaign, with the readings that count. */
export interface PooledRun {
	rig: string;
	rigName: string;
	profile: string;
	profileName: string;
	/** Null for stock. */
	parentId: number | null;
	workload: WorkloadFacts;
	tester: string;
	startedAt: Date;
	ambientC: number | null;
	values: number[];
}

export interface Named {
	slug: string;
	name: string;
}

export interface Pool {
	/** Profiles as they are told apart here: with their rig where there are several. */
	profiles: Named[];
	workloads: WorkloadFacts[];
	matrix: CampaignMatrix;
}

/** Runs of many campaigns as one matrix: a profile of each rig by itself, workload by workload. Null for no run. */
export function poolRuns(runs: readonly PooledRun[], over?: string): Pool | null {
	const severalRigs = new Set(runs.map((run) => run.rig)).size > 1;
	const slugOf = (run: PooledRun) => (severalRigs ? `${run.rig}.${run.profile}` : run.profile);
	const nameOf = (run: PooledRun) => (severalRigs ? `${run.rigName}, ${run.profileName}` : run.profileName);
	const ordered = [...runs].sort(
		(a, b) =>
			a.rig.localeCompare(b.rig) ||
			Number(b.parentId === null) - Number(a.parentId === null) ||
			a.profileName.localeCompare(b.profileName)
	);
	const profiles = [...new Map(ordered.map((run) => [slugOf(run), nameOf(run)]))].map(([slug, name]) => ({
		slug,
		name
	}));
	const workloads = [...new Map(ordered.map((run) => [run.workload.slug, run.workload])).values()].sort(
		(a, b) => a.name.localeCompare(b.name)
	);
	const baseline = profiles.find((one) => one.slug === over) ?? profiles[0];
	if (!baseline) return null;
	return {
		profiles,
		workloads,
		matrix: {
			baseline: baseline.slug,
			profiles: profiles.map((one) => one.slug),
			workloads: workloads.map((workload) => ({ ...workload, needed: workload.repeats })),
			signatures: [],
			runs: [...runs]
				.sort((a, b) => a.startedAt.getTime() - b.startedAt.getTime())
				.map((run): CampaignRun => ({
					profile: slugOf(run),
					workload: run.workload.slug,
					tester: run.tester,
					startedAt: run.startedAt.toISOString(),
					ambientC: run.ambientC,
					voided: false,
					readings: run.values.map((value) => ({ value, excluded: false }))
				}))
		}
	};
}
