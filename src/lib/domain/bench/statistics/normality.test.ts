import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalityHint } from './normality';
import { shapiroWilk } from './shapiro-wilk';

const weights = [148, 154, 158, 160, 161, 162, 166, 170, 182, 195, 236];

describe("Shapiro and Wilk's test", () => {
	it.each([
		// Shapiro & Wilk 1965; SciPy's user guide prints these W and p.
		[weights, 0.7888146948631716, 0.006703814061898823, 1e-8],
		// scipy/stats/tests/test_morestats.py, TestShapiro, "verified by R" to six digits.
		[
			[
				0.11, 7.87, 4.61, 10.14, 7.95, 3.14, 0.46, 4.43, 0.21, 4.75, 0.71, 1.52, 3.24, 0.93, 0.42, 4.97, 9.53,
				4.55, 0.47, 6.66
			],
			0.90047299861907959,
			0.042089745402336121,
			1e-6
		],
		[
			[
				1.36, 1.14, 2.92, 2.55, 1.46, 1.06, 5.27, -1.11, 3.48, 1.1, 0.88, -0.51, 1.46, 0.52, 6.2, 1.69, 0.08,
				3.67, 2.81, 3.49
			],
			0.959027,
			0.5246,
			1e-4
		],
		// SciPy, as a public project's tests record it: three and five readings, where the formulas differ.
		[[1, 2, 10], 0.8321917808219177, 0.19391752148145214, 1e-9],
		[[1, 1.5, 2, 2.5, 9], 0.7135481348491046, null, 1e-9],
		// SciPy 1.17.1, scipy.stats.shapiro; public listings of R's shapiro.test(mtcars$mpg) print 0.94756 and 0.1229.
		[
			[
				21, 21, 22.8, 21.4, 18.7, 18.1, 14.3, 24.4, 22.8, 19.2, 17.8, 16.4, 17.3, 15.2, 10.4, 10.4, 14.7,
				32.4, 30.4, 33.9, 21.5, 15.5, 15.2, 13.3, 19.2, 27.3, 26, 30.4, 15.8, 19.7, 15, 21.4
			],
			0.9475647265971182,
			0.12288135948636081,
			1e-6
		]
	])('of %j', (values, w, p, tolerance) => {
		const found = shapiroWilk(values);
		expect(Math.abs(found.w - w)).toBeLessThan(tolerance);
		if (p !== null) expect(Math.abs(found.p - p)).toBeLessThan(tolerance);
	});

	it('minds neither order nor unit nor zero', () => {
		const readings = fc.array(fc.integer({ min: 0, max: 1000 }), { minLength: 3, maxLength: 50 });
		fc.assert(
			fc.property(readings, fc.integer({ min: -500, max: 500 }), (values, shift) => {
				if (new Set(values).size < 2) return;
				const plain = shapiroWilk(values);
				const other = shapiroWilk([...values].reverse().map((value) => 8 * (value + shift)));
				expect(other.w).toBeCloseTo(plain.w, 10);
				expect(plain.w).toBeGreaterThan(0);
				expect(plain.w).toBeLessThanOrEqual(1);
				expect(plain.p).toBeGreaterThanOrEqual(0);
				expect(plain.p).toBeLessThanOrEqual(1);
			})
		);
	});

	it('refuses too few, too many, no numbers, and what does not vary', () => {
		for (const wrong of [[1, 2], Array.from({ length: 51 }, (_, i) => i), [1, 2, Number.NaN], [3, 3, 3]]) {
			expect(() => shapiroWilk(wrong)).toThrow(RangeError);
		}
	});
});

describe('the hint', () => {
	it('is silent below eight readings, beyond fifty, and where nothing varies', () => {
		expect(normalityHint([1, 2, 3, 4, 5, 6, 70])).toBeNull();
		expect(normalityHint(Array.from({ length: 51 }, (_, i) => i))).toBeNull();
		expect(normalityHint(Array.from({ length: 9 }, () => 3))).toBeNull();
	});

	it('points at what to look for', () => {
		expect(normalityHint(weights)?.words).toContain('drift');
		expect(normalityHint([1, 2, 3, 4, 5, 6, 7, 8])?.words).toContain('proves little');
	});
});
