import { driftOf, offSpans, spanAt, type OffSpan, type StockRun } from './drift';
import type { Direction } from './words';

/** Every run of stock with one workload on one rig, in the order they were taken. */
export interface DriftFacts {
	rig: { slug: string; name: string };
	workload: { slug: string; name: string; unit: string; better: Direction };
	runs: StockRun[];
}

interface StoredStockRun {
	id: number;
	rigSlug: string;
	rigName: string;
	revision: number;
	campaign: string;
	campaignName: string;
	workload: string;
	workloadName: string;
	unit: string;
	better: Direction;
	startedAt: Date;
	values: number[];
}

/** Runs of stock gathered by rig and workload, each in the order given; what was run once only is left out. */
export function driftFacts(runs: readonly StoredStockRun[]): DriftFacts[] {
	const found = new Map<string, DriftFacts>();
	for (const row of runs) {
		const key = `${row.rigSlug}/${row.workload}`;
		const facts = found.get(key) ?? {
			rig: { slug: row.rigSlug, name: row.rigName },
			workload: { slug: row.workload, name: row.workloadName, unit: row.unit, better: row.better },
			runs: []
		};
		found.set(key, facts);
		facts.runs.push({
			run: row.id,
			campaign: row.campaign,
			campaignName: row.campaignName,
			revision: row.revision,
			at: row.startedAt.toISOString(),
			values: row.values
		});
	}
	return [...found.values()].filter((facts) => facts.runs.length > 1);
}

/** A stretch in which a rig was off, with the workload whose stock said so. */
export interface RigOff extends OffSpan {
	workload: string;
	workloadName: string;
}

/**
 * Every stretch in which some workload's stock says that its rig was off, by the usual window. Only runs of one
 * revision are held together: a revised rig was changed on purpose.
 */
export const rigOff = (facts: readonly DriftFacts[], revision: number): RigOff[] =>
	facts.flatMap(({ workload, runs }) =>
		offSpans(driftOf(runs.filter((run) => run.revision === revision))).map((span) => ({
			...span,
			workload: workload.slug,
			workloadName: workload.name
		}))
	);

interface TimedRun {
	profile: string;
	workload: string;
	startedAt: string;
	voided: boolean;
}

export interface CellOff {
	profile: string;
	workload: string;
	/** One sentence for the screen. */
	words: string;
}

/** The cells of a campaign with a run that counts and began while the rig was off, by stock of the same workload first. */
export function cellsOff(runs: readonly TimedRun[], off: readonly RigOff[]): CellOff[] {
	const cells = new Map<string, CellOff>();
	for (const { profile, workload, startedAt, voided } of runs) {
		const key = `${profile}/${workload}`;
		if (voided || cells.has(key)) continue;
		const own = off.filter((span) => span.workload === workload);
		const span = spanAt(own, startedAt) ?? spanAt(off, startedAt);
		if (!span) continue;
		const day = span.from.slice(0, 10);
		cells.set(key, {
			profile,
			workload,
			words: `Measured while the rig was off: stock in ${span.workloadName} on ${day} was ${span.words}.`
		});
	}
	return [...cells.values()];
}
