import { describe, expect, it } from 'vitest';
import { fieller, ratioDf } from './fieller';

// Ten degrees of freedom at the estimated ratio 2 from shares 9 to 16: 5.392 a side.
const df = (10 * (9 ** 2 + 16 ** 2)) / 25 ** 2;

describe("Fieller's interval from summaries", () => {
	it('DCPROGS DCSTATS: 14 and 7 with deviations 3 and 2 of the estimates, 90 %', () => {
		const [top, bottom] = [
			{ mean: 14, varianceOfMean: 9, df },
			{ mean: 7, varianceOfMean: 4, df }
		];
		expect(ratioDf(top, bottom)).toBeCloseTo(10, 12);
		const [low, high] = fieller(top, bottom, 0.9) ?? [];
		expect(low).toBeCloseTo(1.051412795418, 10);
		expect(high).toBeCloseTo(4.414296490023, 10);
		// At 99.9 % neither mean is clear of zero.
		expect(fieller(top, bottom, 0.999)).toBeNull();
	});

	// The same page, six readings a side: the deviations are then those of one reading, not of the mean.
	it.each([
		[0.9, 1.544787663, 2.64235275],
		[0.95, 1.456596496, 2.833157584],
		[0.99, 1.272774783, 3.360377957]
	])('DCPROGS DCSTATS, deviations of single readings, %d', (level, lower, upper) => {
		const [low, high] =
			fieller({ mean: 14, varianceOfMean: 9 / 6, df }, { mean: 7, varianceOfMean: 4 / 6, df }, level) ?? [];
		expect(low).toBeCloseTo(lower, 8);
		expect(high).toBeCloseTo(upper, 8);
	});
});
