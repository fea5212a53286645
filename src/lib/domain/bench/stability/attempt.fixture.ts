import type { Attempt } from './attempt';

/** An attempt for the tests: what a test does not name is a full pass of the heaviest stress. */
export const attempt = (given: Partial<Attempt> = {}): Attempt => ({
	clockMHz: 4800,
	volts: 1.25,
	stress: 'long-sums',
	stressKind: 'heaviest',
	durationMin: 30,
	outcome: 'passed',
	failure: given.outcome === 'failed' ? 'error' : '',
	errors: 0,
	peakTempC: null,
	packageW: null,
	at: '2026-11-11T09:30:00Z',
	...given
});

/** Full passes and early failures of one stress at one voltage, by their clocks. */
export const tried = (passedMHz: number[], failedMHz: number[], volts = 1.25): Attempt[] => [
	...passedMHz.map((clockMHz) => attempt({ clockMHz, volts })),
	...failedMHz.map((clockMHz) => attempt({ clockMHz, volts, outcome: 'failed', durationMin: 4 }))
];
