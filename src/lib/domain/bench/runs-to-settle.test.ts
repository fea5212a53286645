import { describe, expect, it } from 'vitest';
import { heldAgainst, type HeldWorkload } from './held-against';
import { runsToSettle } from './runs-to-settle';
import { runsNeeded } from './statistics/runs-needed';
import { runsNeededOfMedians } from './statistics/runs-needed-of-medians';
import { logMedianError } from './statistics/robust';
import { summarise } from './statistics/summary';

// A slip in each set: it widens the mean's error and leaves the median's alone.
const stock = [100, 101, 99, 100.5, 99.5, 100.2, 130, 98.5, 101.5, 99.8, 100.9];
const tuned = [101.8, 102.6, 100.9, 102.2, 101.5, 102, 74, 100.4, 103.4, 101.7, 102.8];

const asked = (headline: HeldWorkload['headline'], unit = 'ns') => {
	const rules: HeldWorkload = { slug: 'walk', unit, better: 'higher', headline, leastDifferencePercent: 1 };
	const [ours, theirs] = [summarise(tuned, headline), summarise(stock, headline)];
	const cells = [
		{ profile: 'stock', workload: 'walk', summary: theirs },
		{ profile: 'tuned', workload: 'walk', summary: ours }
	];
	const standing = heldAgainst(cells, [rules], 'stock')[1];
	if (!standing) throw new Error('no standing');
	return { ours, theirs, rules, needed: runsToSettle(standing, ours, theirs, rules) };
};

describe('what would settle a cell', () => {
	it('is reckoned from the medians where the workload prints them', () => {
		const { ours, theirs, needed } = asked('median');
		const of = (values: number[], { median }: { median: number }) => ({
			n: 11,
			median,
			logError: logMedianError(values)
		});
		expect(needed).toEqual(runsNeededOfMedians(of(tuned, ours), of(stock, theirs), 'higher', 1));
		expect(needed).toMatchObject({ kind: 'runs', outcome: 'difference' });
	});

	it('and from the means where it prints those', () => {
		const { ours, theirs, needed } = asked('mean');
		expect(needed).toEqual(runsNeeded(ours, theirs, 'higher', 1));
		expect(needed).not.toEqual(asked('median').needed);
	});

	it('is a difference where a ratio says nothing, and none where there is a verdict', () => {
		const { ours, theirs, rules, needed } = asked('mean', '°C');
		expect(needed?.kind).toBeDefined();
		expect(runsToSettle({ comparison: null, difference: null }, ours, theirs, rules)).toBeNull();
	});
});
