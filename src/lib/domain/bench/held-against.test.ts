import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { costOf } from './cost-of';
import { comparedTogether, heldAgainst, overallAgainst, type HeldWorkload } from './held-against';
import { compareCells } from './statistics/compare';
import { holm } from './statistics/holm';
import { summarise } from './statistics/summary';

const workload = (given: Partial<HeldWorkload> = {}): HeldWorkload => ({
	slug: 'tile-render',
	unit: 'events/s',
	better: 'higher',
	headline: 'mean',
	leastDifferencePercent: 1,
	...given
});
const cell = (profile: string, values: number[], slug = 'tile-render') => ({
	profile,
	workload: slug,
	summary: values.length > 0 ? summarise(values) : null
});
const oneOver = (rule: HeldWorkload, subject: number[], baseline: number[]) =>
	heldAgainst([cell('stock', baseline, rule.slug), cell('tuned', subject, rule.slug)], [rule], 'stock')[1];

describe('cells held against a baseline', () => {
	it('CRAN statpsych, ci.ratio.median2: 1.162162, 0.927667 to 1.455933, where the median is printed', () => {
		const y1 = [36, 44, 47, 42, 49, 39, 46, 31, 33, 48];
		const y2 = [32, 39, 26, 35, 43, 27, 40, 37, 34, 29, 49, 42, 40];
		const held = oneOver(workload({ headline: 'median' }), y1, y2)?.comparison;
		expect(held?.ratio).toBeCloseTo(1.162162, 6);
		expect(held?.ci95?.[0]).toBeCloseTo(0.927667, 6);
		expect(held?.ci95?.[1]).toBeCloseTo(1.455933, 6);
		expect(oneOver(workload(), y1, y2)?.comparison?.ratio).toBeCloseTo(41.5 / (473 / 13), 12);
	});

	it('holds degrees by difference, with a share of the baseline as what matters', () => {
		const held = oneOver(workload({ unit: '°C', better: 'lower' }), [71, 71.2, 70.8], [80, 80.2, 79.8]);
		expect(held?.comparison).toBeNull();
		expect(held?.difference).toMatchObject({ verdict: 'better', alone: 'better' });
		expect(held?.difference?.difference).toBeCloseTo(9, 12);
		expect(held?.difference?.least).toBeCloseTo(0.8, 12);
		expect(held?.difference?.why).toContain('no true zero');
	});

	it('has neither for the baseline, and for an empty side', () => {
		const [stock, tuned] = heldAgainst([cell('stock', [1, 2]), cell('tuned', [])], [workload()], 'stock');
		expect([stock, tuned]).toEqual([
			{ comparison: null, difference: null },
			{ comparison: null, difference: null }
		]);
	});

	it('leaves ratios and intervals alone and only ever takes a verdict back', () => {
		const readings = fc.array(fc.double({ min: 90, max: 110, noNaN: true }), { minLength: 2, maxLength: 6 });
		fc.assert(
			fc.property(readings, fc.array(readings, { minLength: 1, maxLength: 6 }), (baseline, others) => {
				const cells = [cell('stock', baseline), ...others.map((values, at) => cell(`p${at}`, values))];
				const held = heldAgainst(cells, [workload()], 'stock').slice(1);
				for (const [at, values] of others.entries()) {
					const own = compareCells(values, baseline, 'higher', 1);
					const comparison = held[at]?.comparison;
					expect(comparison).toMatchObject({ ratio: own.ratio, ci95: own.ci95, alone: own.verdict });
					expect([own.verdict, 'not-enough']).toContain(comparison?.verdict);
				}
			})
		);
	});

	it('takes back what many comparisons together do not bear (Holm, as R’s p.adjust: the least p times their number)', () => {
		const [baseline, tuned] = [
			[100, 101, 99],
			[103.8, 104.6, 103.2]
		];
		const alone = oneOver(workload(), tuned, baseline)?.comparison;
		expect(alone?.verdict).toBe('better');
		const many = [
			cell('stock', baseline),
			...Array.from({ length: 12 }, (_, at) => cell(`p${at}`, at === 0 ? tuned : [100.2, 101.4, 99.1]))
		];
		const table = heldAgainst(many, [workload()], 'stock');
		expect(comparedTogether(table)).toBe(12);
		expect(table[1]?.comparison).toMatchObject({ alone: 'better', verdict: 'not-enough' });
		expect(holm([0.01, ...Array<number>(11).fill(0.9)])[0]).toBeCloseTo(0.12, 12);
	});
});

describe('the overall figure over a baseline', () => {
	const rules = [
		workload(),
		workload({ slug: 'source-build', unit: 's', better: 'lower', headline: 'median' })
	];
	const cells = (['stock', 'tuned'] as const).flatMap((profile) => [
		cell(profile, profile === 'stock' ? [100, 101, 99] : [110, 111, 109]),
		cell(profile, profile === 'stock' ? [50, 52, 51, 50.5] : [46, 45, 45.5, 47], 'source-build')
	]);
	const over = (profile: string, baseline: string) => {
		const standings = heldAgainst(cells, rules, baseline);
		const held = cells.map((one, at) => ({ ...one, comparison: standings[at]?.comparison ?? null }));
		return overallAgainst(held, rules, profile, baseline);
	};

	it('is of the averages in print, and its interval holds it', () => {
		const figure = over('tuned', 'stock');
		expect(figure?.ratio).toBeCloseTo(Math.sqrt(1.1 * (50.75 / 45.75)), 12);
		expect(figure?.ci95?.[0]).toBeLessThan(figure?.ratio ?? 0);
		expect(figure?.ci95?.[1]).toBeGreaterThan(figure?.ratio ?? 0);
	});

	it('turns round with its sides', () => {
		const [forth, back] = [over('tuned', 'stock'), over('stock', 'tuned')];
		expect(back?.ci95?.[0]).toBeCloseTo(1 / (forth?.ci95?.[1] ?? 0), 12);
		expect(back?.ratio).toBeCloseTo(1 / (forth?.ratio ?? 0), 12);
	});

	describe('rests on performance alone', () => {
		const mean = fc.double({ min: 1, max: 1000, noNaN: true });
		const unit = fc.constantFrom(
			'points',
			's',
			'frames/s',
			'GB/s',
			'ns',
			'W',
			'J',
			'dB(A)',
			'sone',
			'K',
			'°C',
			'A',
			'V',
			'EUR'
		);
		const column = fc.record({
			unit,
			better: fc.constantFrom('higher' as const, 'lower' as const),
			stock: mean,
			tuned: mean
		});
		type Column = typeof column extends fc.Arbitrary<infer C> ? C : never;
		const figureOf = (columns: readonly Column[], profile = 'tuned', baseline = 'stock') => {
			const ruled = columns.map((one, at) =>
				workload({ slug: `w-${at}`, unit: one.unit, better: one.better })
			);
			const filled = columns.flatMap(({ stock, tuned }, at) => [
				cell('stock', [stock, stock * 1.01, stock * 0.99], `w-${at}`),
				cell('tuned', [tuned, tuned * 1.02, tuned * 0.98], `w-${at}`)
			]);
			const standings = heldAgainst(filled, ruled, baseline);
			const held = filled.map((one, at) => ({ ...one, comparison: standings[at]?.comparison ?? null }));
			return overallAgainst(held, ruled, profile, baseline);
		};
		const performance = ({ unit: name }: Column) => costOf(name) === null;

		it('whatever the costs beside it are', () => {
			fc.assert(
				fc.property(fc.array(column, { maxLength: 8 }), mean, (columns, other) => {
					const figure = figureOf(columns);
					const without = figureOf(columns.filter(performance));
					const changed = figureOf(columns.map((one) => (performance(one) ? one : { ...one, tuned: other })));
					expect(figure?.ratio).toBe(without?.ratio);
					expect(figure?.ci95).toEqual(without?.ci95);
					expect(changed).toEqual(figure);
				})
			);
		});

		it('and every workload is in it, missing from it or left aside', () => {
			fc.assert(
				fc.property(fc.array(column, { minLength: 1, maxLength: 8 }), (columns) => {
					const figure = figureOf(columns);
					if (!figure) {
						expect(columns.some(performance)).toBe(false);
						return;
					}
					const aside = figure.aside ?? [];
					expect(
						[...figure.workloads, ...figure.missing, ...aside.map((one) => one.workload)].sort()
					).toEqual(columns.map((_, at) => `w-${at}`).sort());
					expect(aside.map(({ workload: slug, cost }) => [slug, cost])).toEqual(
						columns.flatMap((one, at) => (performance(one) ? [] : [[`w-${at}`, costOf(one.unit)]]))
					);
				})
			);
		});

		it('minds neither the order of the columns, nor their units, nor which side is the baseline', () => {
			fc.assert(
				fc.property(fc.array(column, { minLength: 1, maxLength: 8 }), mean, (columns, factor) => {
					const figure = figureOf(columns);
					if (!figure) return;
					const near = (ratio: number | undefined, wanted: number) =>
						expect(Math.abs((ratio ?? NaN) / wanted - 1)).toBeLessThan(1e-9);
					near(figureOf([...columns].reverse())?.ratio, figure.ratio);
					near(
						figureOf(columns.map((one) => ({ ...one, stock: one.stock * factor, tuned: one.tuned * factor })))
							?.ratio,
						figure.ratio
					);
					near(figureOf(columns, 'stock', 'tuned')?.ratio, 1 / figure.ratio);
				})
			);
		});
	});
});
