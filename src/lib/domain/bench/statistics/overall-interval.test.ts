import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { overallInterval } from './overall-interval';
import { spread } from './sides';

const faster = spread([104.2, 105.1, 103.8, 104.9, 104.5]);
const slower = spread([98.7, 99.4, 98.9, 99.9, 99.1]);
const pair = { subject: faster, baseline: slower, better: 'higher' as const };

describe('the interval of the overall figure', () => {
	it('of one workload is the log-delta interval of its ratio (computed with SciPy, Welch)', () => {
		const { ratio, ci95, df } = overallInterval([pair]) ?? {};
		expect(ratio).toBeCloseTo(1.05342741935, 10);
		expect(df).toBeCloseTo(7.97182277573, 10);
		expect(relative(ci95?.[0] ?? NaN, 1.04595902562)).toBeLessThan(1e-11);
		expect(relative(ci95?.[1] ?? NaN, 1.06094913917)).toBeLessThan(1e-11);
	});

	it('narrows as independent workloads are added, and not as the same one is', () => {
		const copy = (times: number) => Array.from({ length: times }, () => ({ ...pair }));
		const fresh = Array.from({ length: 4 }, () => ({
			...pair,
			subject: { ...faster },
			baseline: { ...slower }
		}));
		const width = (inputs: (typeof pair)[]) => {
			const ci95 = overallInterval(inputs)?.ci95 ?? [NaN, NaN];
			return Math.log(ci95[1] / ci95[0]);
		};
		expect(relative(width(copy(4)), width([pair]))).toBeLessThan(1e-12);
		// Half the standard error, and more degrees of freedom, so a little less than half the width.
		expect(width(fresh)).toBeLessThan(width([pair]) / 2);
		expect(width(fresh)).toBeGreaterThan((width([pair]) / 2) * 0.85);
	});

	it('counts a baseline that two ratios share once, with the weight of both', () => {
		// By hand: var = ¼(u₁ + u₂) + u_b, where u = s²/(n x̄²).
		const other = spread([101, 103, 102, 104, 102]);
		const u = (of: typeof faster) => (of.sd ?? NaN) ** 2 / of.n / of.mean ** 2;
		const shared = overallInterval([pair, { ...pair, subject: other }]);
		const [a, b, c] = [u(faster) / 4, u(other) / 4, u(slower)];
		expect(relative(shared?.df ?? NaN, (a + b + c) ** 2 / ((a * a + b * b + c * c) / 4))).toBeLessThan(1e-12);
	});

	const side = fc
		.array(fc.double({ min: 95, max: 105, noNaN: true }), { minLength: 2, maxLength: 6 })
		.filter((values) => Math.max(...values) - Math.min(...values) > 0.01);
	const workloads = fc.array(
		fc.record({
			subject: side.map(spread),
			baseline: side.map(spread),
			better: fc.constantFrom('higher' as const, 'lower' as const)
		}),
		{ minLength: 1, maxLength: 8 }
	);

	it('inverts with the sides and with the direction, and minds neither order nor unit', () => {
		fc.assert(
			fc.property(workloads, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (inputs, unit) => {
				const forth = overallInterval(inputs);
				const turned = inputs.map(({ subject, baseline, better }) => ({
					subject: baseline,
					baseline: subject,
					better
				}));
				const opposite = inputs.map((input) => ({
					...input,
					better: input.better === 'higher' ? ('lower' as const) : ('higher' as const)
				}));
				const scale = (of: typeof faster) => ({ ...of, mean: of.mean * unit, sd: (of.sd ?? 0) * unit });
				const scaled = [...inputs].reverse().map(({ subject, baseline, better }) => ({
					subject: scale(subject),
					baseline: scale(baseline),
					better
				}));
				const [low, high] = forth?.ci95 ?? [NaN, NaN];
				for (const back of [overallInterval(turned), overallInterval(opposite)]) {
					expect(relative(back?.ci95?.[0] ?? NaN, 1 / high)).toBeLessThan(1e-10);
					expect(relative(back?.ci95?.[1] ?? NaN, 1 / low)).toBeLessThan(1e-10);
				}
				expect(relative(overallInterval(scaled)?.ci95?.[0] ?? NaN, low)).toBeLessThan(1e-10);
			})
		);
	});

	it('is none without readings, without scatter known, or with a mean not clear of zero', () => {
		expect(overallInterval([])).toBeNull();
		expect(overallInterval([{ ...pair, subject: spread([104]) }])).toMatchObject({ ci95: null, df: null });
		expect(overallInterval([{ ...pair, baseline: spread([0.1, 5, 0.2]) }])?.ci95).toBeNull();
		const still = spread([2, 2]);
		expect(overallInterval([{ ...pair, subject: still, baseline: spread([1, 1]) }])).toEqual({
			ratio: expect.closeTo(2, 14) as unknown,
			ci95: [expect.closeTo(2, 14) as unknown, expect.closeTo(2, 14) as unknown],
			df: null
		});
		expect(() => overallInterval([{ ...pair, subject: spread([-1, 0]) }])).toThrow(RangeError);
	});
});
