import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attempt, tried } from './attempt.fixture';
import { highestPassed } from './highest-passed';

const demands = { 'long-sums': 30, 'wide-sums': 60, 'frame-walk': 15 };

// Definitions of this application; common practice, no source.
describe('highest passed', () => {
	it('takes full passes alone, and shows a higher short one', () => {
		const [result] = highestPassed(
			[
				...tried([4700, 4800], [4950, 4900]),
				attempt({ clockMHz: 4850, durationMin: 12 }),
				attempt({ clockMHz: 5100, outcome: 'stopped' })
			],
			demands
		).stresses;
		expect(result).toMatchObject({
			passed: { clockMHz: 4800 },
			short: { clockMHz: 4850 },
			failed: { clockMHz: 4900 }
		});
	});

	it('of equal clocks, the pass with the least voltage and the fail with the most', () => {
		const [result] = highestPassed(
			[...tried([4800], [4900], 1.3), ...tried([4800], [4900], 1.2), ...tried([4800], [4900], 1.25)],
			demands
		).stresses;
		expect(result).toMatchObject({ passed: { volts: 1.2 }, failed: { volts: 1.3 } });
	});

	it('sets heaviest and everyday side by side, each held back by its hardest stress', () => {
		const everyday = { stress: 'frame-walk', stressKind: 'everyday' } as const;
		const { kinds, stresses } = highestPassed(
			[
				attempt({ clockMHz: 4900 }),
				attempt({ clockMHz: 4700, stress: 'wide-sums', durationMin: 60 }),
				attempt({ clockMHz: 4800, stress: 'wide-sums', outcome: 'failed' }),
				attempt({ clockMHz: 5100, ...everyday })
			],
			demands
		);
		expect(stresses.map((one) => one.stress)).toEqual(['long-sums', 'wide-sums', 'frame-walk']);
		expect(kinds.heaviest).toEqual({
			clockMHz: 4700,
			volts: 1.25,
			heldBackBy: 'wide-sums',
			lowestFailedMHz: 4800,
			lowestFailedVolts: 1.25,
			stresses: ['long-sums', 'wide-sums']
		});
		expect(kinds.everyday).toMatchObject({ clockMHz: 5100, lowestFailedMHz: null, lowestFailedVolts: null });
	});

	it('allows no clock to a kind while one of its stresses has passed none', () => {
		const { kinds } = highestPassed([attempt(), attempt({ stress: 'wide-sums', durationMin: 30 })], demands);
		expect(kinds.heaviest).toMatchObject({ clockMHz: null, heldBackBy: 'wide-sums' });
		expect(kinds.everyday).toMatchObject({ clockMHz: null, heldBackBy: null, stresses: [] });
	});

	it('names what does not fit', () => {
		expect(highestPassed(tried([4950], [4900]), demands).contradictions).toHaveLength(1);
		expect(highestPassed(tried([4900], [4950]), demands).contradictions).toEqual([]);
	});

	it('does not depend on the order of attempts', () => {
		const clocks = fc.array(fc.integer({ min: 100, max: 120 }), { minLength: 1 });
		fc.assert(
			fc.property(clocks, clocks, (passes, fails) => {
				const [result] = highestPassed(tried(passes, fails).toReversed(), demands).stresses;
				expect(result?.passed?.clockMHz).toBe(Math.max(...passes));
				expect(result?.failed?.clockMHz).toBe(Math.min(...fails));
			})
		);
	});
});
