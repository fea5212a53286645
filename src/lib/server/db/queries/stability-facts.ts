import type { LadderFacts } from '../../../domain/bench/stability/ladder-facts';
import type { SweepFacts } from '../../../domain/bench/stability/sweep-facts';
import { grouped } from '../../../domain/shared/grouped';
import type { Db } from '../client';
import * as attempts from './attempt';
import * as ladders from './ladder';
import type * as sweeps from './sweep';
import * as passes from './sweep-pass';

const factsOf = (
	row: ladders.LadderRow,
	stresses: ladders.StressRow[],
	rows: attempts.AttemptRow[]
): LadderFacts => ({
	slug: row.slug,
	name: row.name,
	rig: { slug: row.rigSlug, name: row.rigName, revision: row.revision },
	profile: { slug: row.profileSlug, name: row.profileName },
	stepMHz: row.stepMhz,
	limits: {
		clockMHz: row.limitClockMhz,
		volts: row.limitVolts,
		tempC: row.limitTempC,
		source: row.limitSource
	},
	stresses: stresses.map(({ slug, name, kind, minutes }) => ({ slug, name, kind, minutes })),
	attempts: rows
		.filter((one) => one.voidedAt === null)
		.map((one) => ({
			clockMHz: one.clockMHz,
			volts: one.volts,
			stress: one.stress,
			stressKind: one.stressKind,
			durationMin: one.durationMin,
			outcome: one.outcome,
			failure: one.failure,
			errors: one.errors,
			peakTempC: one.peakTempC,
			packageW: one.packageW,
			at: one.startedAt.toISOString()
		}))
		.reverse()
});

/** Ladders with their stresses and attempts, in the order given; three queries however many there are. */
export async function ofLadders(db: Db, rows: ladders.LadderRow[]) {
	const ids = rows.map((row) => row.id);
	const [stresses, tried] = await Promise.all([ladders.stressesOf(db, ids), attempts.ofLadders(db, ids)]);
	const stressesOf = grouped(stresses, (one) => one.ladderId);
	const triedOf = grouped(tried, (one) => one.ladderId);
	return rows.map((row) => {
		const mine = triedOf.get(row.id) ?? [];
		return { row, attempts: mine, facts: factsOf(row, stressesOf.get(row.id) ?? [], mine) };
	});
}

/** Sweeps with their passes and points, in the order given. */
export async function ofSweeps(db: Db, rows: sweeps.SweepRow[]) {
	const driven = await passes.ofSweeps(
		db,
		rows.map((row) => row.id)
	);
	const points = await passes.pointsOf(
		db,
		driven.map((pass) => pass.id)
	);
	const pointsOf = grouped(points, (one) => one.passId);
	const drivenOf = grouped(driven, (one) => one.sweepId);
	return rows.map((row) => {
		const mine = (drivenOf.get(row.id) ?? []).map((pass) => ({
			...pass,
			points: (pointsOf.get(pass.id) ?? []).map(({ passId: _, ...point }) => point)
		}));
		const facts: SweepFacts = {
			slug: row.slug,
			name: row.name,
			rig: { slug: row.rigSlug, name: row.rigName, revision: row.revision },
			profile: { slug: row.profileSlug, name: row.profileName },
			workload: { slug: row.workloadSlug, name: row.workloadName },
			wantedMHz: row.wantedClockMhz,
			stepA: row.currentStepA,
			passes: mine
				.filter((pass) => pass.voidedAt === null)
				.map(({ number, startedAt, points: own }) => ({
					number,
					startedAt: startedAt.toISOString(),
					points: own
				}))
		};
		return { row, passes: mine, facts };
	});
}
