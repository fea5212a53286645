import type { DriftSpec } from '../../../domain/articles/plates/drift-spec';
import { driftSpec } from '../../../domain/articles/plates/drift-spec';
import { driftOf, type Drift } from '../../../domain/bench/drift';
import { driftFacts, type DriftFacts } from '../../../domain/bench/drift-facts';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { DriftQuery } from '../../../schemas/drift';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import * as stock from '../../db/queries/stock-runs';

export interface DriftPage {
	rigs: { slug: string; name: string }[];
	/** Those of the chosen rig. */
	workloads: { slug: string; name: string }[];
	/** Null where nothing was ever run with stock. */
	chosen: { rig: string; workload: string } | null;
	facts: DriftFacts | null;
	drift: Drift | null;
	plate: DriftSpec | null;
	zone: string;
}

type Choice = Awaited<ReturnType<typeof stock.measured>>;

const longest = (rows: Choice) => rows.toSorted((a, b) => b.runs - a.runs)[0];

/** What was asked for, else where stock was run most often: there drift shows first. */
function choose(all: Choice, asked: DriftQuery) {
	const ofRig = all.filter((row) => row.rig === asked.rig);
	const among = ofRig.length > 0 ? ofRig : all.filter((row) => row.rig === longest(all)?.rig);
	return { among, row: among.find((one) => one.workload === asked.workload) ?? longest(among) };
}

/** Stock of one rig with one workload over time: what there is to choose from, the chart, and what it signals. */
export async function readDrift(ctx: Context, asked: DriftQuery): Promise<Outcome<DriftPage>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [all, { zone }] = await Promise.all([stock.measured(ctx.db), settings.publication(ctx.db)]);
	const { among, row } = choose(all, asked);
	const runs = row ? await stock.ofRigs(ctx.db, { rigs: [row.rigId], workload: row.workload }) : [];
	const [facts = null] = driftFacts(runs);
	const window = { from: asked.from, to: asked.to };
	return done({
		rigs: [...new Map(all.map((one) => [one.rig, { slug: one.rig, name: one.rigName }])).values()],
		workloads: among.map((one) => ({ slug: one.workload, name: one.workloadName })),
		chosen: row ? { rig: row.rig, workload: row.workload } : null,
		facts,
		drift: facts && driftOf(facts.runs, window),
		plate: facts && driftSpec(facts, zone, { window }),
		zone
	});
}
