import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { meanInterval } from './interval';
import { relative } from './nearly.fixture';
import { spread } from './sides';
import { energyPerTask, scorePerPrice, scorePerWatt } from './value';

describe('figures of value', () => {
	const powerW = { n: 5, mean: 140.5, sd: 2 };
	const timeS = { n: 5, mean: 5, sd: 0.1 };

	it('energy: 140.5 W for 5 s is 702.5 J (the trapezoid of the same log, computed with R)', () => {
		const { value, u, ci95 } = energyPerTask(powerW, timeS);
		expect(value).toBeCloseTo(702.5, 10);
		// By hand: √((2/√5/140.5)² + (0.1/√5/5)²) · 702.5.
		expect(u).toBeCloseTo(702.5 * Math.sqrt(4 / 5 / 140.5 ** 2 + 0.01 / 5 / 25), 10);
		expect(ci95?.[0]).toBeLessThan(702.5 - 2 * (u ?? NaN));
	});

	it('a score for each watt, and what it costs', () => {
		expect(scorePerWatt({ n: 3, mean: 1405, sd: 10 }, powerW).value).toBeCloseTo(10, 12);
		const score = spread([1000, 1010, 990]);
		const price = { amount: 500, currency: 'EUR', date: '2026-11-30' };
		const found = scorePerPrice(score, price);
		expect(found).toMatchObject({ value: 2, currency: 'EUR', date: '2026-11-30' });
		// A price is exact, so the interval is Student's of the score.
		const [low, high] = meanInterval(1000, 10, 3);
		expect(found.ci95?.[0]).toBeCloseTo(low / 500, 10);
		expect(found.ci95?.[1]).toBeCloseTo(high / 500, 10);
	});

	it('carries no interval where a side was read once', () => {
		const once = { n: 1, mean: 5, sd: null };
		expect(energyPerTask(powerW, once)).toEqual({ value: 702.5, u: null, ci95: null });
	});

	it('scales with its units and does not mind which factor is which', () => {
		const side = fc.record({
			n: fc.integer({ min: 2, max: 20 }),
			mean: fc.double({ min: 1, max: 1000, noNaN: true }),
			sd: fc.double({ min: 0.01, max: 0.5, noNaN: true })
		});
		fc.assert(
			fc.property(side, side, (a, b) => {
				const forth = energyPerTask(a, b);
				const back = energyPerTask(b, a);
				expect(relative(back.u ?? NaN, forth.u ?? NaN)).toBeLessThan(1e-12);
				const kilo = energyPerTask({ ...a, mean: a.mean * 1000, sd: a.sd * 1000 }, b);
				expect(relative(kilo.u ?? NaN, 1000 * (forth.u ?? NaN))).toBeLessThan(1e-12);
				const inverse = scorePerWatt(a, b);
				expect(relative((inverse.u ?? NaN) / inverse.value, (forth.u ?? NaN) / forth.value)).toBeLessThan(
					1e-12
				);
			})
		);
	});

	it('refuses zero and below', () => {
		for (const mean of [0, -1, Number.NaN, Infinity]) {
			const wrong = { n: 2, mean, sd: 1 };
			expect(() => energyPerTask(wrong, timeS)).toThrow(RangeError);
			expect(() => energyPerTask(powerW, wrong)).toThrow(RangeError);
			expect(() => scorePerWatt(wrong, powerW)).toThrow(RangeError);
			expect(() => scorePerWatt(powerW, wrong)).toThrow(RangeError);
			expect(() => scorePerPrice(powerW, { amount: mean, currency: 'EUR', date: '2026-11-30' })).toThrow(
				RangeError
			);
			expect(() => scorePerPrice(wrong, { amount: 1, currency: 'EUR', date: '2026-11-30' })).toThrow(
				RangeError
			);
		}
	});
});
