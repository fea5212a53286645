import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ofInstrument, ofResolution, rectangular } from './instrument';
import {
	combined,
	contributions,
	coverageFactor,
	effectiveDf,
	expand,
	relativeComponents,
	typeA
} from './uncertainty';
import { relative } from './nearly.fixture';

const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

describe('type A', () => {
	// Readings and u 0.333 as a public project's checks quote table 1 of that clause.
	it('JCGM 100:2008, 4.4.3: twenty temperatures, u 0.333', () => {
		const { u, df } = typeA([
			96.9, 98.18, 98.25, 98.61, 99.03, 99.49, 99.56, 99.74, 99.89, 100.07, 100.33, 100.42, 100.68, 100.95,
			101.11, 101.2, 101.57, 101.84, 102.36, 102.72
		]);
		expect(u).toBeCloseTo(0.332915747205, 11);
		expect(df).toBe(19);
		expect(() => typeA([3])).toThrow(RangeError);
	});
});

describe('type B', () => {
	it('is a rectangle of the accuracy, and of the step of a display', () => {
		expect(rectangular(1)).toBeCloseTo(0.57735026919, 11);
		expect(ofResolution(1)).toBeCloseTo(0.288675134595, 11);
		expect(ofInstrument(120, { percentOfReading: 0.5, digits: 2, resolution: 0.1 })).toBeCloseTo(
			0.8 / Math.sqrt(3),
			12
		);
		expect(ofInstrument(-120, { percentOfReading: 0.5, fixed: 1 })).toBeCloseTo(1.6 / Math.sqrt(3), 12);
		expect(ofInstrument(120, {})).toBe(0);
	});

	it('refuses digits without their size, and parts below zero', () => {
		expect(() => ofInstrument(1, { digits: 2 })).toThrow(RangeError);
		expect(() => ofInstrument(1, { percentOfReading: -1 })).toThrow(RangeError);
		expect(() => rectangular(-1)).toThrow(RangeError);
	});

	it('five runs and a display step of 0.1 (computed): u 0.211738832', () => {
		const runs = typeA([98.7, 99.4, 98.9, 99.9, 99.1]);
		expect(combined([runs, { u: ofResolution(0.1) }])).toBeCloseTo(0.211738832, 8);
	});
});

describe('combined uncertainty', () => {
	// JCGM 100:2008, H.1, end gauge, in nm and °C: l = l_S + d − l_S (δα θ + α_S δθ).
	const length = 50_000_623;
	const gauge = [
		{ u: 25, df: 18 },
		{ u: 9.7, df: 25.6 },
		{ u: 1.2e-6, sensitivity: 0 },
		{ u: 0.41, sensitivity: 0 },
		{ u: 0.58e-6, sensitivity: length * 0.1, df: 50 },
		{ u: 0.029, sensitivity: -length * 11.5e-6, df: 2 }
	];

	it('GUM H.1: contributions 25, 9.7, 0, 0, 2.9, 16.7; u 32 nm; 16 degrees of freedom; U99 93 nm', () => {
		const published = [25, 9.7, 0, 0, 2.900036, -16.675208];
		contributions(gauge).forEach((part, index) => expect(part).toBeCloseTo(published[index] ?? NaN, 5));
		const { u, df, k, expanded } = expand(gauge, 0.99);
		expect(u).toBeCloseTo(31.71061, 5);
		expect(df).toBeCloseTo(16.656063, 5);
		expect(k).toBeCloseTo(2.9207816, 6);
		expect(Math.round(expanded)).toBe(93);
	});

	// Readings as three public projects quote table H.2, all alike.
	it('GUM H.2: resistance, reactance and impedance with correlated inputs', () => {
		const volts = [5.007, 4.994, 5.005, 4.99, 4.999];
		const amps = [19.663e-3, 19.639e-3, 19.64e-3, 19.685e-3, 19.678e-3];
		const phases = [1.0456, 1.0438, 1.0468, 1.0428, 1.0433];
		const [v, i, phi] = [mean(volts), mean(amps), mean(phases)];
		const [uv, ui, up] = [typeA(volts), typeA(amps), typeA(phases)];
		const correlations = [
			{ between: [0, 1] as const, r: -0.355311 },
			{ between: [0, 2] as const, r: 0.857624 },
			{ between: [1, 2] as const, r: -0.645111 }
		];
		const of = (byVolt: number, byAmp: number, byPhase: number) =>
			combined(
				[
					{ ...uv, sensitivity: byVolt },
					{ ...ui, sensitivity: byAmp },
					{ ...up, sensitivity: byPhase }
				],
				correlations
			);
		const [cos, sin] = [Math.cos(phi), Math.sin(phi)];
		expect((v * cos) / i).toBeCloseTo(127.732169928, 8);
		expect(of(cos / i, (-v * cos) / i ** 2, (-v * sin) / i)).toBeCloseTo(0.07107141, 4);
		expect(of(sin / i, (-v * sin) / i ** 2, (v * cos) / i)).toBeCloseTo(0.29558168, 5);
		expect(of(1 / i, -v / i ** 2, 0)).toBeCloseTo(0.23633613, 5);
	});

	it('of a quotient is the relative form of the same thing', () => {
		const factors = [
			{ value: 4.999, u: 0.0032, df: 4 },
			{ value: 19.661e-3, u: 9.5e-6, df: 4, power: -1 }
		];
		const [v, i] = factors;
		const ratio = (v?.value ?? NaN) / (i?.value ?? NaN);
		const absolute = combined([
			{ u: 0.0032, sensitivity: 1 / 19.661e-3 },
			{ u: 9.5e-6, sensitivity: 4.999 / 19.661e-3 ** 2 }
		]);
		expect(relative(combined(relativeComponents(factors)) * ratio, absolute)).toBeLessThan(1e-12);
		expect(() => relativeComponents([{ value: 0, u: 1 }])).toThrow(RangeError);
	});

	const components = fc.array(
		fc.record({ u: fc.double({ min: 0.01, max: 10, noNaN: true }), df: fc.integer({ min: 1, max: 100 }) }),
		{ minLength: 1, maxLength: 8 }
	);

	it('does not mind order, scales, and has degrees of freedom between the least and the sum', () => {
		fc.assert(
			fc.property(components, (list) => {
				expect(relative(combined([...list].reverse()), combined(list))).toBeLessThan(1e-12);
				expect(combined(list.map((one) => ({ ...one, sensitivity: 3 })))).toBeCloseTo(3 * combined(list), 8);
				const df = effectiveDf(list);
				expect(df).toBeGreaterThanOrEqual(Math.min(...list.map((one) => one.df)) * (1 - 1e-12));
				expect(df).toBeLessThanOrEqual(list.reduce((sum, one) => sum + one.df, 0) * (1 + 1e-12));
			})
		);
	});

	it('cancels what is wholly correlated and opposed', () => {
		const twice = [{ u: 2 }, { u: 2, sensitivity: -1 }];
		expect(combined(twice, [{ between: [0, 1], r: 1 }])).toBe(0);
		expect(combined(twice)).toBeCloseTo(Math.sqrt(8), 12);
	});

	it('takes the normal quantile where everything is known', () => {
		expect(effectiveDf([{ u: 1 }, { u: 2 }])).toBe(Infinity);
		expect(coverageFactor(Infinity)).toBeCloseTo(1.95996398454, 9);
		expect(coverageFactor(10)).toBeCloseTo(2.22813885199, 9);
	});

	it('refuses what has no answer', () => {
		expect(() => combined([{ u: -1 }])).toThrow(RangeError);
		expect(() => combined([{ u: 1 }, { u: 1 }], [{ between: [0, 1], r: 1.1 }])).toThrow(RangeError);
		expect(() => combined([{ u: 1 }], [{ between: [0, 1], r: 0.1 }])).toThrow(RangeError);
		expect(() => effectiveDf([{ u: 1, df: 0 }])).toThrow(RangeError);
		expect(() => coverageFactor(0.5)).toThrow(RangeError);
	});
});
