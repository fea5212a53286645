import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { controlChart, signals, signalWords } from './control-chart';
import { controlLimits, movingRanges } from './control-limits';
import { ewma } from './ewma';

// NIST/SEMATECH e-Handbook §6.3.2.2, flow rate of ten batches; figures as a public project's checks quote that page.
const flow = [49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6, 52.1];

describe('limits of an individuals chart', () => {
	it('NIST e-Handbook §6.3.2.2: mean 50.81, MR̄ 1.8778, limits 45.8159 and 55.8041', () => {
		const limits = controlLimits(flow);
		movingRanges(flow).forEach((range, index) =>
			expect(range).toBeCloseTo([2, 2.3, 1.4, 3.5, 3.4, 1.4, 0.2, 1.2, 1.5][index] ?? NaN, 10)
		);
		expect(limits.centre).toBeCloseTo(50.81, 10);
		expect(limits.averageMovingRange).toBeCloseTo(1.8778, 4);
		expect(limits.upper).toBeCloseTo(55.8041, 3);
		expect(limits.lower).toBeCloseTo(45.8159, 3);
		expect(limits.upperMovingRange).toBeCloseTo(3.267 * 1.8778, 3);
		// 2.66, as it is usually printed.
		expect((limits.upper - limits.centre) / limits.averageMovingRange).toBeCloseTo(2.66, 2);
	});

	it('refuses a single reading, no number, and what does not vary', () => {
		for (const wrong of [[1], [1, Number.NaN], [2, 2, 2]])
			expect(() => controlLimits(wrong)).toThrow(RangeError);
	});
});

describe('the weighted average', () => {
	// NIST/SEMATECH e-Handbook §6.3.2.4: λ 0.3, EWMA₀ 50, s 2.0539; readings, averages and limits as seven public
	// projects' checks quote that page, all alike.
	const series = [
		52, 47, 53, 49.3, 50.1, 47, 51, 50.1, 51.2, 50.5, 49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6,
		52.1
	];
	const printed = [
		50.6, 49.52, 50.56, 50.18, 50.16, 49.21, 49.75, 49.85, 50.26, 50.33, 50.11, 49.36, 49.52, 50.05, 49.38,
		49.92, 50.73, 51.23, 51.94, 51.99
	];

	it('NIST e-Handbook §6.3.2.4', () => {
		const points = ewma(series, { centre: 50, sigma: 2.0539 }, 0.3, 3);
		// The page carries two decimals from step to step.
		points.forEach((point, index) =>
			expect(Math.abs(point.ewma - (printed[index] ?? NaN))).toBeLessThan(0.011)
		);
		expect(points.at(-1)?.upper).toBeCloseTo(52.5884, 3);
		expect(points.at(-1)?.lower).toBeCloseTo(47.4115, 3);
		expect(points.every((point) => point.ewma < point.upper && point.ewma > point.lower)).toBe(true);
	});

	it('begins with the limits of one weighted reading', () => {
		const [first] = ewma([51], { centre: 50, sigma: 2 }, 0.3, 3);
		expect(first?.upper).toBeCloseTo(50 + 3 * 2 * 0.3, 12);
	});

	it('is the readings themselves where the newest has all the weight', () => {
		expect(ewma([4, 9], { centre: 5, sigma: 1 }, 1, 3)).toEqual([
			{ ewma: 4, lower: 2, upper: 8 },
			{ ewma: 9, lower: 2, upper: 8 }
		]);
		for (const wrong of [0, 1.2, Number.NaN]) {
			expect(() => ewma([4], { centre: 5, sigma: 1 }, wrong, 3)).toThrow(RangeError);
		}
	});
});

describe('a control chart', () => {
	const signalsOf = (values: number[]) => controlChart(flow, values).points.map((point) => point.signals);

	it('is quiet while the bench is in order', () => {
		expect(signalsOf([50, 51.2, 50.4, 51.5])).toEqual([[], [], [], []]);
	});

	it('names a reading beyond its limit, and a jump', () => {
		expect(signalsOf([51, 59])[1]).toEqual(['above-limit', 'jump', 'average-above']);
		expect(signalsOf([48, 45.5])[1]).toContain('below-limit');
	});

	it('names eight in a row on one side at the eighth', () => {
		const [above, below] = [51, 50.6].map((value) => signalsOf(Array.from({ length: 9 }, () => value)));
		expect(above?.map((raised) => raised.includes('run-above'))).toEqual([
			...Array<boolean>(7).fill(false),
			true,
			true
		]);
		expect(below?.[8]).toEqual(['run-below']);
	});

	it('sees a slow rise that no single reading shows', () => {
		const { points } = controlChart(flow, [52, 52.5, 53, 53.2, 53.4, 53.6, 53.8]);
		expect(points.at(-1)?.signals).toEqual(['average-above']);
	});

	it('begins its average anew at the centre once a shift is mended, and then keeps quiet', () => {
		const { limits, points } = controlChart(flow, [61, 62, 61.5, 50, 51, 50.6, 51.2]);
		expect(points.map(({ begun }) => begun)).toEqual([null, null, null, 'mended', null, null, null]);
		// The way back is a jump; what follows is as a chart that begins there.
		expect(points.map((point) => point.signals).slice(3)).toEqual([['jump'], [], [], []]);
		const fresh = ewma([50, 51, 50.6, 51.2], limits, 0.2, 2.7);
		points.slice(3).forEach(({ ewma: average, lower, upper }, at) => {
			expect({ ewma: average, lower, upper }).toEqual(fresh[at]);
		});
	});

	it('keeps its average while the shift lasts, however long', () => {
		const { points } = controlChart(
			flow,
			Array.from({ length: 12 }, (_, at) => 53 + (at % 3) * 0.2)
		);
		expect(points.every(({ begun }) => begun === null)).toBe(true);
		expect(points.slice(4).every((point) => point.signals.includes('average-above'))).toBe(true);
	});

	it('does not begin anew after a jump that stays in order, which has no side', () => {
		const { points } = controlChart(flow, [48, 54.5, 50, 51]);
		expect(points.map((point) => point.signals)).toEqual([[], ['jump'], [], []]);
		expect(points.every(({ begun }) => begun === null)).toBe(true);
	});

	it('begins anew with a revised rig, what is in a row as well', () => {
		const values = Array.from({ length: 12 }, () => 51.2);
		const { points } = controlChart(flow, values, { revised: new Set([7]) });
		expect(points[7]?.begun).toBe('revision');
		expect(points[7]?.ewma).toBeCloseTo(0.2 * 51.2 + 0.8 * 50.81, 12);
		expect(points.some((point) => point.signals.includes('run-above'))).toBe(false);
		expect(controlChart(flow, values).points[7]?.signals).toEqual(['run-above']);
	});

	it('has an average of the readings since it last began, whatever they are', () => {
		fc.assert(
			fc.property(fc.array(fc.double({ min: 30, max: 70, noNaN: true }), { maxLength: 20 }), (values) => {
				const { limits, points } = controlChart(flow, values);
				points.forEach((point, at) => {
					const from = points.slice(0, at + 1).findLastIndex(({ begun }) => begun !== null);
					const since = ewma(values.slice(Math.max(0, from), at + 1), limits, 0.2, 2.7).at(-1);
					expect(point.ewma).toBe(since?.ewma);
					expect(point.upper).toBe(since?.upper);
				});
			})
		);
	});

	it('minds neither zero nor unit, and turns round with the readings', () => {
		const turned: Record<string, string> = {
			'above-limit': 'below-limit',
			'below-limit': 'above-limit',
			jump: 'jump',
			'average-above': 'average-below',
			'average-below': 'average-above',
			'run-above': 'run-below',
			'run-below': 'run-above'
		};
		fc.assert(
			fc.property(fc.array(fc.double({ min: 40, max: 60, noNaN: true }), { maxLength: 20 }), (values) => {
				const plain = controlChart(flow, values).points.map((point) => point.signals);
				const mirrored = controlChart(
					flow.map((value) => 7 - 3 * value),
					values.map((value) => 7 - 3 * value)
				);
				expect(mirrored.points.map((point) => point.signals.map((signal) => turned[signal]).sort())).toEqual(
					plain.map((raised) => [...raised].sort())
				);
			})
		);
	});

	it('has words for every signal and refuses what is no number', () => {
		expect(Object.keys(signalWords).sort()).toEqual([...signals].sort());
		expect(() => controlChart(flow, [Infinity])).toThrow(RangeError);
	});
});
