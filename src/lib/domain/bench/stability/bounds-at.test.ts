import { describe, expect, it } from 'vitest';
import { attempt, tried } from './attempt.fixture';
import { boundsAt } from './bounds-at';

const at = (attempts: Parameters<typeof boundsAt>[0], volts = 1.25) =>
	boundsAt(attempts, { stress: 'long-sums', volts, demands: { 'long-sums': 30 } });

// Common practice, no source.
describe('bounds at a voltage', () => {
	it('the highest pass and the lowest fail', () => {
		expect(at(tried([4700, 4800], [5000, 4900]))).toMatchObject({
			passed: { clockMHz: 4800 },
			failed: { clockMHz: 4900 },
			overruled: []
		});
	});

	it('a pass with less voltage counts, and a fail with more', () => {
		expect(at([...tried([4800], [], 1.2), ...tried([], [4950], 1.3)])).toMatchObject({
			passed: { clockMHz: 4800, volts: 1.2 },
			failed: { clockMHz: 4950, volts: 1.3 }
		});
	});

	it('a pass with more voltage says nothing, nor a fail with less', () => {
		expect(at([...tried([4800], [], 1.3), ...tried([], [4750], 1.2)])).toEqual({
			passed: null,
			failed: null,
			overruled: []
		});
	});

	it('a fail outranks a pass at or above it', () => {
		const bounds = at(tried([4700, 4900, 4950], [4900]));
		expect(bounds).toMatchObject({ passed: { clockMHz: 4700 }, failed: { clockMHz: 4900 } });
		expect(bounds.overruled.map((one) => one.clockMHz)).toEqual([4950, 4900]);
	});

	it('neither short passes, stops nor other stresses count', () => {
		expect(
			at([
				attempt({ durationMin: 5 }),
				attempt({ outcome: 'stopped' }),
				attempt({ stress: 'frame-walk', outcome: 'failed' })
			])
		).toMatchObject({ passed: null, failed: null });
	});
});
