import { describe, expect, it } from 'vitest';
import { heldAgainst } from './held-against';
import type { CellFigures, WorkloadFacts } from './figures';
import { geometricMean } from './statistics/geometric-mean';
import { summarise } from './statistics/summary';
import { type TradeOffInput, tradeOffs } from './trade-off';
import { tradeOffWords } from './trade-off-words';
import { perPower, perPrice } from './value-figures';

const workload = (given: Partial<WorkloadFacts> & { slug: string }): WorkloadFacts => ({
	name: given.slug,
	programVersion: '',
	settings: '',
	quantity: 'throughput',
	unit: 'frames/s',
	better: 'higher',
	class: 'all-core',
	headline: 'mean',
	leastDifferencePercent: 1,
	warmUps: 1,
	repeats: 3,
	coolDownS: 0,
	...given
});

function input(
	workloads: WorkloadFacts[],
	readings: Record<string, Record<string, number[]>>
): TradeOffInput {
	const profiles = Object.keys(readings).map((slug) => ({ slug, name: slug }));
	const bare = profiles.flatMap(({ slug }) =>
		workloads.map((one) => ({
			profile: slug,
			workload: one.slug,
			summary: readings[slug]?.[one.slug] ? summarise(readings[slug][one.slug] ?? []) : null
		}))
	);
	const standings = heldAgainst(bare, workloads, 'stock');
	const cells = bare.map((cell, at): CellFigures => ({
		...cell,
		needed: 3,
		comparison: standings[at]?.comparison ?? null,
		difference: standings[at]?.difference ?? null,
		signedBy: null,
		signedAt: null,
		testers: [],
		from: null,
		to: null,
		ambientC: null
	}));
	return { profiles, workloads, cells, baseline: 'stock' };
}

const tight = (value: number) => [value * 0.999, value, value * 1.001];
const workloads = [
	workload({ slug: 'render' }),
	workload({ slug: 'build', unit: 's', better: 'lower' }),
	workload({ slug: 'sieve', unit: 's', better: 'lower', class: 'light-threaded' }),
	workload({ slug: 'draw', unit: 'W', better: 'lower', quantity: 'power' }),
	workload({ slug: 'hottest', unit: '°C', better: 'lower', class: 'stress', quantity: 'temperature' })
];
const campaign = input(workloads, {
	stock: { render: tight(100), build: tight(200), sieve: tight(30), draw: tight(140), hottest: tight(72) },
	fixed: { render: tight(112), build: tight(180), sieve: tight(33), draw: tight(180), hottest: tight(85) },
	thin: { render: [103], build: tight(200), sieve: tight(30) }
});
const of = (profile: string) => {
	const found = tradeOffs(campaign).find((one) => one.profile === profile);
	if (!found) throw new Error(`no ${profile}`);
	return found;
};

describe('a trade-off', () => {
	it('has the geometric mean of each class, without costs and stress', () => {
		const { classes } = of('fixed');
		expect(classes.map((one) => [one.class, one.of.map(({ workload: slug }) => slug)])).toEqual([
			['light-threaded', ['sieve']],
			['all-core', ['render', 'build']]
		]);
		expect(classes[1]?.overall?.ratio).toBeCloseTo(geometricMean([1.12, 200 / 180]), 12);
		expect(classes[1]?.overall?.ci95?.[0]).toBeLessThan(classes[1]?.overall?.ratio ?? 0);
	});

	it('has costs as they are and as they differ, in their unit', () => {
		const [draw, hottest] = of('fixed').costs;
		expect(draw).toMatchObject({ kind: 'power', verdict: 'worse', unit: 'W' });
		expect(draw?.more).toBeCloseTo(40, 12);
		expect(hottest).toMatchObject({ kind: 'temperature', verdict: 'worse', gainPercent: null });
		expect(hottest?.more).toBeCloseTo(13, 12);
		expect(of('stock').costs[0]).toMatchObject({ more: null, verdict: null });
	});

	it('says in words what the verdicts say', () => {
		const plain = JSON.stringify(tradeOffWords(of('fixed'))).replaceAll('\u00a0', ' ');
		expect(JSON.parse(plain)).toEqual({
			gains: 'Gains: all-core work (render +12.0 %, build +11.1 %).',
			givesUp:
				'Gives up: light-threaded work (sieve −9.1 %); power (draw +40.00 W); temperature (hottest +13.00 °C).',
			same: null,
			open: null
		});
	});

	it('claims nothing without a verdict', () => {
		const words = tradeOffWords(of('thin'));
		expect([words.gains, words.givesUp]).toEqual([null, null]);
		expect(words.open).toContain('render');
		expect(JSON.stringify(words)).not.toContain('draw');
		expect(Object.values(tradeOffWords(of('stock')))).toEqual([null, null, null, null]);
	});
});

describe('value for power and price', () => {
	it('takes the power of the same class: energy of what is timed, score per watt of what is counted', () => {
		const [render, build, ...rest] = perPower(campaign);
		expect(rest).toEqual([]);
		expect(render).toMatchObject({
			kind: 'watt',
			workload: 'render',
			unit: 'frames/s per W',
			better: 'higher'
		});
		expect(render?.rows.map(({ profile }) => profile)).toEqual(['stock', 'fixed']);
		expect(render?.rows[0]?.figure.value).toBeCloseTo(100 / 140, 12);
		expect(build).toMatchObject({ kind: 'energy', unit: 'J', better: 'lower', from: ['build', 'draw'] });
		expect(build?.rows[1]?.figure.value).toBeCloseTo(180 * 180, 8);
	});

	it('guesses no pair where a class has two measures of power', () => {
		const two = input([...workloads, workload({ slug: 'wall', unit: 'W', better: 'lower' })], {
			stock: { render: tight(100), draw: tight(140), wall: tight(200) }
		});
		expect(perPower(two)).toEqual([]);
	});

	it('names the price and its day', () => {
		const price = { amount: 400, currency: 'EUR', date: '2026-10-02' };
		const [render, ...rest] = perPrice(campaign, price, 'Aldermoor 1650');
		expect(rest).toEqual([]);
		expect(render?.rows[1]?.figure.value).toBeCloseTo(0.28, 12);
		expect(render?.how).toContain('400 EUR on 2026-10-02');
	});
});
