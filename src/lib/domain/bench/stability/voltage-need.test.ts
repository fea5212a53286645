import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attempt } from './attempt.fixture';
import { voltageNeed } from './voltage-need';

const demands = { 'long-sums': 30 };
const passes = (...points: [clockMHz: number, volts: number][]) =>
	points.map(([clockMHz, volts]) => attempt({ clockMHz, volts }));
const need = (...points: [number, number][]) => voltageNeed(passes(...points), 'long-sums', demands);

// The rule is common practice, no source; the arithmetic by hand.
describe('the voltage that a clock needs', () => {
	it('turns steep at the first step that asks for more than twice the median below', () => {
		const { steps, steep, words } = need(
			[4500, 1.1],
			[4600, 1.125],
			[4700, 1.155],
			[4800, 1.18],
			[4900, 1.235],
			[5000, 1.31]
		);
		expect(steps.map((step) => Math.round(step.mvPer100MHz))).toEqual([25, 30, 25, 55, 75]);
		expect(steep).toMatchObject({ fromMHz: 4800, toMHz: 4900 });
		expect(steep?.medianBelow).toBeCloseTo(25, 9);
		expect(words.replaceAll('\u00a0', ' ')).toBe(
			'Beyond 4800 MHz it turns steep: the next step asks for 55 mV per 100 MHz, the median step below for 25 mV. A step is steep when it asks for more than 2 times the millivolts per 100 MHz of the median step below it, and for more than 10 mV.'
		);
	});

	it('compares uneven steps by what 100 MHz cost', () => {
		const { steps, steep } = need([4500, 1.1], [4600, 1.12], [4800, 1.16], [4825, 1.18]);
		expect(steps.map((step) => Math.round(step.mvPer100MHz))).toEqual([20, 20, 80]);
		expect(steep?.fromMHz).toBe(4800);
	});

	it('after a flat stretch, not for the grain of the board', () => {
		const flat: [number, number][] = [
			[4500, 1.1],
			[4600, 1.1],
			[4700, 1.1]
		];
		expect(need(...flat, [4800, 1.105]).steep).toBeNull();
		expect(need(...flat, [4800, 1.15]).steep).toMatchObject({ fromMHz: 4700, medianBelow: 0 });
	});

	it('keeps the lowest voltage of full passes of this stress', () => {
		const { needs } = voltageNeed(
			[
				...passes([4800, 1.25], [4800, 1.2], [4800, 1.225], [4700, 1.15]),
				attempt({ volts: 1.1, durationMin: 5 }),
				attempt({ volts: 1.1, outcome: 'failed' }),
				attempt({ volts: 1.1, stress: 'frame-walk' })
			],
			'long-sums',
			demands
		);
		expect(needs.map(({ clockMHz, volts }) => [clockMHz, volts])).toEqual([
			[4700, 1.15],
			[4800, 1.2]
		]);
	});

	it('says what is missing', () => {
		expect(need([4500, 1.1], [4600, 1.2]).words).toContain('Four clocks that passed are needed');
		expect(need().needs).toEqual([]);
		expect(need([4500, 1.1], [4600, 1.12], [4700, 1.14], [4800, 1.16]).words).toContain(
			'does not turn steep'
		);
	});

	it('a straight line is never steep', () => {
		fc.assert(
			fc.property(fc.integer({ min: 0, max: 100 }), fc.integer({ min: 4, max: 20 }), (mv, n) => {
				const points = Array.from({ length: n }, (_, i): [number, number] => [
					4000 + 100 * i,
					1 + (mv * i) / 1000
				]);
				expect(need(...points).steep).toBeNull();
			})
		);
	});
});
