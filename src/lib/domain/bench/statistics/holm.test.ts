import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { holm } from './holm';

describe("Holm's correction", () => {
	it('R 4.2.2: p.adjust(c(…), "holm")', () => {
		const published = [0.01, 0.072, 0.312, 0.312, 0.312, 0.312, 0.312, 0.615, 0.615, 0.615];
		const raw = [0.001, 0.008, 0.039, 0.041, 0.042, 0.06, 0.074, 0.205, 0.212, 0.216];
		holm(raw).forEach((p, index) => expect(p).toBeCloseTo(published[index] ?? NaN, 12));
	});

	const list = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 40 });

	it('never lowers a p-value, never passes 1, and keeps the order of the values', () => {
		fc.assert(
			fc.property(list, (raw) => {
				const adjusted = holm(raw);
				raw.forEach((p, i) => {
					expect(adjusted[i]).toBeGreaterThanOrEqual(p);
					expect(adjusted[i]).toBeLessThanOrEqual(1);
					raw.forEach((q, j) => {
						if (p < q) expect(adjusted[i]).toBeLessThanOrEqual(adjusted[j] ?? NaN);
						if (p === q) expect(adjusted[i]).toBe(adjusted[j]);
					});
				});
			})
		);
	});

	it('rejects the same claims as the step-down procedure itself', () => {
		fc.assert(
			fc.property(list, (raw) => {
				const sorted = [...raw].sort((a, b) => a - b);
				const firstKept = sorted.findIndex((p, step) => p * (raw.length - step) >= 0.05);
				const rejected = firstKept < 0 ? raw.length : firstKept;
				expect(holm(raw).filter((p) => p < 0.05)).toHaveLength(rejected);
			})
		);
	});

	it('leaves a single one alone, and none at all', () => {
		expect(holm([0.03])).toEqual([0.03]);
		expect(holm([])).toEqual([]);
	});

	it('refuses what is no probability', () => {
		for (const wrong of [Number.NaN, -0.1, 1.1]) expect(() => holm([0.1, wrong])).toThrow(RangeError);
	});
});
