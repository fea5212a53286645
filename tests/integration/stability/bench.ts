import type { Context } from '../../../src/lib/server/context';
import { ladderInput } from '../../../src/lib/schemas/ladder';
import { sweepPlan } from '../../../src/lib/schemas/sweep';
import { createLadder } from '../../../src/lib/server/services/stability/create-ladder';
import { createSweep } from '../../../src/lib/server/services/stability/create-sweep';
import { addRig, addWorkload, must } from '../bench-plan/plan';

export const ladderTyped = {
	name: 'By hand',
	rig: 'n-12',
	profile: 'stock',
	stresses: [
		{ workload: 'long-sums', kind: 'heaviest', minutes: 30 },
		{ workload: 'tile-render', kind: 'everyday', minutes: '20' },
		{ workload: '', kind: 'everyday', minutes: '' }
	],
	stepMhz: 25,
	limitClockMhz: 5000,
	limitVolts: '1,3',
	limitTempC: 90,
	limitSource: 'the maker’s data sheet'
};

export const sweepTyped = {
	name: 'Where to change over',
	rig: 'n-12',
	profile: 'stock',
	workload: 'tile-render',
	wantedClockMhz: 5400,
	currentStepA: 1
};

export const tried = (more: object = {}) => ({
	stress: 'long-sums',
	clockMHz: 4800,
	volts: 1.2,
	durationMin: 30,
	outcome: 'passed',
	...more
});

/** The invented sweep of the pure tests, in which boost falls under 5400 MHz at 163.333 A (R's approx). */
export const points = [
	[1, 120, 5500],
	[2, 130, 5500],
	[4, 140, 5475],
	[8, 150, 5480],
	[12, 160, 5425],
	[16, 170, 5350],
	[24, 180, 5300]
].map(([threads, currentA, clockMHz]) => ({ threads, currentA, clockMHz }));

/** A rig with two workloads, a ladder and a sweep on it. */
export async function stockStability(ctx: Context) {
	await addRig(ctx);
	await addWorkload(ctx);
	await addWorkload(ctx, { name: 'Long sums', class: 'stress' });
	const ladder = await must(createLadder(ctx, ladderInput.parse(ladderTyped)));
	const sweep = await must(createSweep(ctx, sweepPlan.parse(sweepTyped)));
	return { ladder: ladder.slug, sweep: sweep.slug };
}
