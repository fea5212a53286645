import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from '../statistics/nearly.fixture';
import { fitPower, powerAt } from './power-fit';

describe('power over V²·f', () => {
	// A public worked answer: 2.5 GHz, 80 W dynamic, 20 W static; f −30 % gives 76 W, V −15 % gives 77.8 W.
	it('parts a worked answer into its 20 W and 80 W', () => {
		const fit = fitPower([
			{ clockMHz: 2500, volts: 1, packageW: 100 },
			{ clockMHz: 1750, volts: 1, packageW: 76 },
			{ clockMHz: 2500, volts: 0.85, packageW: 77.8 }
		]);
		expect(fit.baseW).toBeCloseTo(20, 10);
		expect(fit.wPerV2GHz * 2.5).toBeCloseTo(80, 10);
		expect(fit.rises).toBe(true);
	});

	// SciPy 1.17.1: linregress(V*V*f, P) with f in GHz
	const ladder = [
		[4500, 1.1, 142],
		[4600, 1.125, 150.5],
		[4700, 1.16, 163],
		[4800, 1.2, 177],
		[4900, 1.25, 199],
		[5000, 1.31, 226]
	].map(([clockMHz = 0, volts = 0, packageW = 0]) => ({ clockMHz, volts, packageW }));

	it('an invented ladder, against SciPy', () => {
		const fit = fitPower(ladder);
		expect(relative(fit.wPerV2GHz, 26.829162886224342)).toBeLessThan(1e-12);
		expect(relative(fit.baseW, -5.9197700634701675)).toBeLessThan(1e-11);
		expect(relative(fit.rSquared ?? 0, 0.99729673989684)).toBeLessThan(1e-12);
		expect(relative(fit.wPerV2GHzSe, 0.698407419193521)).toBeLessThan(1e-11);
		expect(relative(fit.baseSeW, 4.801249753564316)).toBeLessThan(1e-11);
		expect(relative(fit.residualSdW, 1.8391219989986147)).toBeLessThan(1e-11);
	});

	it('says where it leaves what was measured', () => {
		const fit = fitPower(ladder);
		expect(powerAt(fit, { clockMHz: 4850, volts: 1.22 }).outside).toBe(false);
		expect(powerAt(fit, { clockMHz: 5200, volts: 1.35 }).outside).toBe(true);
	});

	it('recovers exact data', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 0, max: 80, noNaN: true }),
				fc.double({ min: 2, max: 60, noNaN: true }),
				(base, slope) => {
					const fit = fitPower(
						ladder.map(({ clockMHz, volts }) => ({
							clockMHz,
							volts,
							packageW: base + (slope * volts ** 2 * clockMHz) / 1000
						}))
					);
					expect(fit.baseW).toBeCloseTo(base, 8);
					expect(fit.wPerV2GHz).toBeCloseTo(slope, 9);
					expect(powerAt(fit, { clockMHz: 4850, volts: 1.22 }).value).toBeCloseTo(
						base + slope * 1.22 ** 2 * 4.85,
						8
					);
				}
			)
		);
	});

	it('says when power does not rise', () => {
		const falling = ladder.map((point, index) => ({ ...point, packageW: 200 - index }));
		expect(fitPower(falling).rises).toBe(false);
	});

	it('refuses what has no answer', () => {
		expect(() => fitPower(ladder.slice(0, 2))).toThrow(RangeError);
		expect(() =>
			fitPower([4700, 4700, 4700].map((clockMHz) => ({ clockMHz, volts: 1.2, packageW: 150 })))
		).toThrow(RangeError);
		expect(() => fitPower([...ladder, { clockMHz: 4700, volts: 0, packageW: 150 }])).toThrow(RangeError);
		expect(() => fitPower([...ladder, { clockMHz: 4700, volts: 1.2, packageW: -3 }])).toThrow(RangeError);
	});
});
