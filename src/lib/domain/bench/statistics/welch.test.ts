import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { autoJapan, autoUs } from './published.fixture';
import { welch } from './welch';

const expectInterval = (interval: [number, number], low: number, high: number, tolerance = 1e-11) => {
	expect(relative(interval[0], low)).toBeLessThan(tolerance);
	expect(relative(interval[1], high)).toBeLessThan(tolerance);
};

describe("Welch's test", () => {
	it('AUTO83B (e-Handbook §1.3.5.3; Boost.Math prints df 136.87, T −12.946, p 1.571e-025)', () => {
		const { t, df, p, ci } = welch(autoUs, autoJapan);
		expect(relative(t, -12.9462732749)).toBeLessThan(1e-11);
		expect(relative(df, 136.874976673)).toBeLessThan(1e-11);
		expect(relative(p, 1.57085e-25)).toBeLessThan(1e-5);
		expectInterval(ci, -11.91524809464, -8.75762059531);
	});

	it('sleep (Student 1908; R 4.2.2 and SciPy)', () => {
		const { t, df, p, ci, difference } = welch(
			[0.7, -1.6, -0.2, -1.2, -0.1, 3.4, 3.7, 0.8, 0, 2],
			[1.9, 0.8, 1.1, 0.1, -0.1, 4.4, 5.5, 1.6, 4.6, 3.4]
		);
		expect(difference).toBeCloseTo(-1.58, 12);
		expect(relative(t, -1.86081346749)).toBeLessThan(1e-11);
		expect(relative(df, 17.7764735162)).toBeLessThan(1e-11);
		expect(relative(p, 0.0793941401874)).toBeLessThan(1e-11);
		expectInterval(ci, -3.365483230712, 0.205483230712);
	});

	it('the 90 % interval by which equivalence is judged (CRAN TOSTER, test-NCSS1)', () => {
		const first = [452, 874, 554, 447, 356, 754, 558, 574, 664, 682, 547, 435, 245];
		const second = [546, 547, 774, 465, 459, 665, 467, 365, 589, 534, 456, 651, 654, 665, 546, 537];
		const at90 = welch(first, second, 0.9);
		expect(at90.df).toBeCloseTo(19.1690023743, 9);
		expect(at90.p).toBeCloseTo(0.881277932362, 10);
		expectInterval(at90.ci, -100.7871506371, 84.5563814063);
		expectInterval(welch(first, second).ci, -120.27336, 104.04259, 1e-7);
	});

	it('refuses a single reading and what does not vary', () => {
		expect(() => welch([1], [1, 2])).toThrow(RangeError);
		expect(() => welch([1, 1], [2, 2])).toThrow(RangeError);
	});
});
