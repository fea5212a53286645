import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inOrder, inStep } from './scroll-step';

describe('scrolling in step', () => {
	const ends = { from: 1000, to: 4000 };
	it('brings an anchor to the top of both', () => {
		const anchors = [
			{ from: 100, to: 900 },
			{ from: 500, to: 1000 }
		];
		expect(inStep(100, anchors, ends)).toBe(900);
		expect(inStep(500, anchors, ends)).toBe(1000);
		expect(inStep(300, anchors, ends)).toBe(950);
	});

	it('begins and ends together', () => {
		expect(inStep(0, [{ from: 0, to: 300 }], ends)).toBe(0);
		expect(inStep(1000, [{ from: 990, to: 4400 }], ends)).toBe(4000);
	});

	it('never goes back while one side goes on, whatever the anchors', () => {
		const anchor = fc.record({
			from: fc.integer({ min: -50, max: 1500 }),
			to: fc.integer({ min: -50, max: 6000 })
		});
		fc.assert(
			fc.property(fc.array(anchor), fc.nat(1000), fc.nat(1000), (anchors, a, b) => {
				const order = inOrder(anchors);
				const [first, then] = [Math.min(a, b), Math.max(a, b)].map((top) => inStep(top, order, ends));
				expect(first).toBeLessThanOrEqual(then ?? NaN);
				expect(first).toBeGreaterThanOrEqual(0);
				expect(then).toBeLessThanOrEqual(ends.to);
			})
		);
	});
});
