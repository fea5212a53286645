import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareCells, compareSummaries } from './compare';
import { relative } from './nearly.fixture';
import { summarise } from './summary';

const treated = [1.53, 1.75, 2.12, 2.83, 2.58, 2.37, 2.92, 2.08, 3.01, 2.67, 2.06, 2.25, 3.08, 2.01, 1.58];
const control = [
	1.33, 1.78, 1.53, 1.95, 1.83, 1.47, 1.87, 1.55, 2.58, 2.17, 1.97, 1.62, 2.25, 3.53, 2.92, 1.78, 2.22, 2.55,
	2.75
];
const faster = [104.2, 105.1, 103.8, 104.9, 104.5];
const slower = [98.7, 99.4, 98.9, 99.9, 99.1];

const expectInterval = (interval: [number, number] | null, low: number, high: number, tolerance = 1e-11) => {
	expect(relative(interval?.[0] ?? Number.NaN, low)).toBeLessThan(tolerance);
	expect(relative(interval?.[1] ?? Number.NaN, high)).toBeLessThan(tolerance);
};

describe("Fieller's interval of a ratio, unequal variances", () => {
	it('ASAT (Hauschke 1999, CRAN mratios)', () => {
		const { ratio, ci95, gainPercent } = compareCells(treated, control, 'higher', 1);
		expect(ratio).toBeCloseTo(1.11300546448, 11);
		expect(gainPercent).toBeCloseTo(11.300546448, 9);
		expectInterval(ci95, 0.937668878136, 1.325086167725);
	});

	it('Mutagenicity (CRAN mratios), and the other way round', () => {
		const [dosed, vehicle] = [
			[15, 20, 32, 33],
			[1, 2, 2, 2, 3, 3, 5]
		];
		const forth = compareCells(dosed, vehicle, 'higher', 1);
		expect(forth.ratio).toBeCloseTo(9.72222222222, 10);
		expectInterval(forth.ci95, 5.17164813995, 18.65952695647);
		expectInterval(compareCells(dosed, vehicle, 'lower', 1).ci95, 0.0535919266514, 0.1933619559835);
	});

	it('five runs a side (R 4.2.2, t at 7.97182277573 degrees of freedom)', () => {
		const { ratio, ci95 } = compareCells(faster, slower, 'higher', 1);
		expect(ratio).toBeCloseTo(1.05342741935, 10);
		expectInterval(ci95, 1.045957373, 1.06094762242, 1e-9);
	});

	it('is not printed where it has no end', () => {
		// The baseline's mean is within its own error of zero: g ≥ 1.
		expect(compareCells([10, 11, 12], [0.1, 5, 0.2], 'higher', 1)).toMatchObject({
			ci95: null,
			gainCi95: null,
			verdict: 'not-enough'
		});
		expect(compareCells([0.1, 5, 0.2], [10, 11, 12], 'higher', 1)).toMatchObject({
			ci95: null,
			verdict: 'not-enough'
		});
	});

	it('is the ratio alone where nothing varies', () => {
		expect(compareCells([3, 3], [2, 2], 'higher', 1)).toMatchObject({ ci95: [1.5, 1.5], verdict: 'better' });
	});

	const side = fc.array(fc.double({ min: 90, max: 110, noNaN: true }), { minLength: 2, maxLength: 12 });

	it('inverts exactly when the sides or the direction swap', () => {
		fc.assert(
			fc.property(side, side, (a, b) => {
				const forth = compareCells(a, b, 'higher', 2);
				for (const back of [compareCells(b, a, 'higher', 2), compareCells(a, b, 'lower', 2)]) {
					expect(relative(back.ratio, 1 / forth.ratio)).toBeLessThan(1e-13);
					expect(back.ci95 === null).toBe(forth.ci95 === null);
					if (forth.ci95) expectInterval(back.ci95, 1 / forth.ci95[1], 1 / forth.ci95[0], 1e-11);
				}
			})
		);
	});

	it('turns the verdict round with the sides', () => {
		const turned = {
			better: 'worse',
			worse: 'better',
			'no-difference': 'no-difference',
			'not-enough': 'not-enough'
		};
		fc.assert(
			fc.property(side, side, fc.double({ min: 0.1, max: 20, noNaN: true }), (a, b, least) => {
				expect(compareCells(b, a, 'higher', least).verdict).toBe(
					turned[compareCells(a, b, 'higher', least).verdict]
				);
			})
		);
	});

	it('does not depend on order or unit', () => {
		fc.assert(
			fc.property(side, side, (a, b) => {
				const plain = compareCells(a, b, 'higher', 2);
				const other = compareCells(
					[...a].reverse().map((value) => value * 1000),
					b.map((value) => value * 1000),
					'higher',
					2
				);
				expect(relative(other.ratio, plain.ratio)).toBeLessThan(1e-12);
				if (plain.ci95) expectInterval(other.ci95, ...plain.ci95, 1e-10);
			})
		);
	});

	it('holds at the bounds of what a reading may be', () => {
		const { ci95 } = compareCells(treated, control, 'higher', 1);
		for (const unit of [1e-100, 1e99]) {
			const scaled = (values: number[]) => values.map((value) => value * unit);
			expectInterval(
				compareCells(scaled(treated), scaled(control), 'higher', 1).ci95,
				...(ci95 ?? [0, 0]),
				1e-10
			);
		}
	});

	it('is the same from summaries as from readings', () => {
		expect(compareSummaries(summarise(treated), summarise(control), 'lower', 3)).toEqual(
			compareCells(treated, control, 'lower', 3)
		);
	});
});

describe('the verdict', () => {
	it('asks that the whole interval lies beyond what does not matter', () => {
		// 95 %: 1.04596 to 1.06095.
		expect(compareCells(faster, slower, 'higher', 4).verdict).toBe('better');
		expect(compareCells(faster, slower, 'lower', 4).verdict).toBe('worse');
		expect(compareCells(faster, slower, 'higher', 5).verdict).toBe('not-enough');
		expect(compareCells(faster, slower, 'higher', 7).verdict).toBe('no-difference');
	});

	it('calls it no difference from the 90 % interval, as two one-sided tests do', () => {
		// Schuirmann 1987: at 6 % the 95 % interval (to 1.06095) crosses the margin and the 90 % one does not.
		const { ci95, verdict } = compareCells(faster, slower, 'higher', 6);
		expect(ci95?.[1]).toBeGreaterThan(1.06);
		expect(verdict).toBe('no-difference');
	});

	it('needs two readings a side', () => {
		expect(compareCells([200], slower, 'higher', 1)).toMatchObject({
			ci95: null,
			gainCi95: null,
			verdict: 'not-enough'
		});
		expect(compareCells([200], [100], 'higher', 1)).toMatchObject({
			ratio: 2,
			gainPercent: 100,
			verdict: 'not-enough'
		});
	});

	it('refuses what has no ratio', () => {
		expect(() => compareCells([], slower, 'higher', 1)).toThrow(RangeError);
		expect(() => compareCells([0, 0], slower, 'higher', 1)).toThrow(RangeError);
		expect(() => compareCells(faster, [-5, -6], 'higher', 1)).toThrow(RangeError);
		expect(() => compareCells([1, Number.NaN], slower, 'higher', 1)).toThrow(RangeError);
	});

	it('keeps percent changes apart from time saved: 125 s to 100 s is 25 % faster', () => {
		expect(compareCells([100, 100], [125, 125], 'lower', 1).gainPercent).toBeCloseTo(25, 12);
	});
});
