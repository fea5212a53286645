import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { moved, sweep } from './sweep.fixture';
import { switchPoint } from './switch-point';

const at = (passes: Parameters<typeof switchPoint>[0], wantedMHz = 5400) =>
	switchPoint(passes, { wantedMHz, stepA: 1 });

describe('switch point', () => {
	// R 4.2.2: approx on the antitonic fit of the same points
	it('one pass: a crossing without an interval', () => {
		const point = at([sweep]);
		expect(point).toMatchObject({ kind: 'crosses', ci95: null, marginA: 1, setA: 162 });
		expect(point.crossingA).toBeCloseTo(163.333333333, 9);
		expect(point.fit.map(({ clockMHz }) => clockMHz)).toEqual([5500, 5500, 5477.5, 5477.5, 5425, 5350, 5300]);
	});

	it('crosses once where the readings themselves cross three times', () => {
		const point = at([sweep], 5478);
		// By hand on the fit: 130 + (5500 − 5478) / (5500 − 5477.5) · 10
		expect(point.crossingA).toBeCloseTo(139.777777778, 9);
	});

	// R's crossing, moved by −1, 0 and +1 A: sd 1, so half of the interval is qt(.975, 2) / sqrt(3) = 4.30265272975 / √3
	it('repeated passes: the mean, with Student’s t over their crossings', () => {
		const point = at([moved(-1), sweep, moved(1)]);
		const half = 4.30265272975 / Math.sqrt(3);
		expect(point.crossingA).toBeCloseTo(163.333333333, 9);
		expect(point.ci95?.[0]).toBeCloseTo(163.333333333 - half, 8);
		expect(point.ci95?.[1]).toBeCloseTo(163.333333333 + half, 8);
		expect(point.marginA).toBeCloseTo(half + 1, 8);
		expect(point.setA).toBe(159);
	});

	it('guesses nothing beyond what was measured', () => {
		expect(at([sweep], 5250)).toMatchObject({ kind: 'not-reached', crossingA: null, ci95: null, setA: null });
		expect(at([sweep], 5501)).toMatchObject({ kind: 'always-below', crossingA: null });
	});

	it('has no interval where the passes do not agree that there is a crossing', () => {
		const short = sweep.slice(0, 5);
		const point = at([sweep, short]);
		expect(point.passes.map((one) => one.kind)).toEqual(['crosses', 'not-reached']);
		expect(point.kind).toBe('crosses');
		expect(point.ci95).toBeNull();
		expect(at([short, short, sweep.slice(0, 4)])).toMatchObject({ kind: 'not-reached', ci95: null });
	});

	it('does not depend on the order of points, and lies within what was measured', () => {
		const pass = fc.uniqueArray(
			fc.record({
				currentA: fc.integer({ min: 1, max: 400 }),
				clockMHz: fc.integer({ min: 4000, max: 6000 })
			}),
			{ minLength: 2, maxLength: 40, selector: ({ currentA }) => currentA }
		);
		fc.assert(
			fc.property(pass, (points) => {
				const point = at([points], 5000);
				expect(at([points.toReversed()], 5000)).toEqual(point);
				if (point.crossingA === null) return;
				const currents = points.map(({ currentA }) => currentA);
				expect(point.crossingA).toBeGreaterThanOrEqual(Math.min(...currents));
				expect(point.crossingA).toBeLessThanOrEqual(Math.max(...currents));
			})
		);
	});

	it('refuses what has no answer', () => {
		expect(() => at([])).toThrow(RangeError);
		expect(() => at([sweep.slice(0, 1)])).toThrow(RangeError);
		expect(() => at([sweep], 0)).toThrow(RangeError);
		expect(() => switchPoint([sweep], { wantedMHz: 5400, stepA: -1 })).toThrow(RangeError);
	});
});
