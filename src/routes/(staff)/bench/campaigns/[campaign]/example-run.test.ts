import { describe, expect, it } from 'vitest';
import type { CellRun } from '$lib/domain/bench/cell-runs';
import { runInput } from '$lib/schemas/run';
import { exampleRun } from './example-run';

const run = (values: number[], voided: string | null = null): CellRun => ({
	id: 1,
	version: 1,
	tester: 'Ada',
	source: 'grid',
	startedAt: new Date('2026-12-01T09:00:00Z'),
	ambientC: null,
	notes: '',
	voided,
	readings: values.map((value, id) => ({ id, value, excluded: id === 0 ? 'typed wrongly' : null }))
});
const cell = { profile: 'early', workload: 'render', runs: [] as CellRun[], baselineValues: [31.5, 31.6] };
const workloads = [{ slug: 'render', unit: 's' }];

describe('the example of a run', () => {
	it('carries readings of the cell that count, and is what the API takes', () => {
		const body = exampleRun(
			{ ...cell, runs: [run([9, 9], 'fan stopped'), run([99, 28.1, 28.2])] },
			workloads
		);
		expect(body).toEqual({ profile: 'early', workload: 'render', unit: 's', readings: [28.1, 28.2] });
		expect(runInput.safeParse(body).success).toBe(true);
	});
	it('takes the baseline’s readings where the cell has none, and is never empty', () => {
		expect(exampleRun(cell, workloads).readings).toEqual([31.5, 31.6]);
		expect(exampleRun({ ...cell, baselineValues: null }, workloads).readings).toHaveLength(1);
	});
});
