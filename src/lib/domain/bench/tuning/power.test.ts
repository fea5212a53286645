import { describe, expect, it } from 'vitest';
import { dynamicPowerFactor } from './power';

describe('dynamic power against stock', () => {
	// A public worked answer: voltage −15 %, frequency −14 %.
	it('0.85² × 0.86', () => {
		expect(dynamicPowerFactor({ volts: 0.85, clock: 0.86 }, { volts: 1, clock: 1 })).toBeCloseTo(0.62135, 10);
	});

	// Exact decimal arithmetic.
	it('0.85³', () => {
		expect(dynamicPowerFactor({ volts: 0.85, clock: 0.85 }, { volts: 1, clock: 1 })).toBeCloseTo(
			0.614125,
			10
		);
	});

	// Public lecture notes: 3.0 → 3.3 V and 300 → 330 MHz are +33.1 %.
	it('1.1³', () => {
		expect(dynamicPowerFactor({ volts: 3.3, clock: 330 }, { volts: 3, clock: 300 })).toBeCloseTo(1.331, 10);
	});

	// Computed: 1.20 → 1.35 V and 4.7 → 5.2 GHz.
	it('raised', () => {
		expect(dynamicPowerFactor({ volts: 1.35, clock: 5.2 }, { volts: 1.2, clock: 4.7 })).toBeCloseTo(
			1.400265957447,
			10
		);
	});

	it('refuses what is not above zero', () => {
		expect(() => dynamicPowerFactor({ volts: 0, clock: 1 }, { volts: 1, clock: 1 })).toThrow(RangeError);
	});
});
