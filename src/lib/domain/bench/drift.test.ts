import { describe, expect, it } from 'vitest';
import { cellsOff, driftFacts, rigOff } from './drift-facts';
import { driftOf, fitWindow, offSpans, spanAt, type StockRun } from './drift';

const at = (day: number) => new Date(Date.UTC(2026, 8, day, 8)).toISOString();
const runs = (means: number[]): StockRun[] =>
	means.map((mean, index) => ({
		run: index + 1,
		campaign: 'stock-again',
		campaignName: 'Stock again',
		revision: 1,
		at: at(index + 1),
		values: [mean - 1, mean + 1]
	}));

// NIST/SEMATECH e-Handbook §6.3.2.2, flow rate of ten batches; figures as a public project's checks quote that page.
const flow = [49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6, 52.1];

describe('drift', () => {
	it('NIST e-Handbook §6.3.2.2: mean 50.81, limits 45.8159 and 55.8041 from the runs held to be in order', () => {
		const { limits } = driftOf(runs([...flow, 70]), { from: 1, to: 10 });
		expect(limits?.centre).toBeCloseTo(50.81, 10);
		expect(limits?.upper).toBeCloseTo(55.8041, 3);
		expect(limits?.lower).toBeCloseTo(45.8159, 3);
	});

	it('names the signals of the runs that follow, and judges none before or within the window', () => {
		const { points } = driftOf(runs([90, ...flow, 50, 62, 50]), { from: 2, to: 11 });
		expect(points.map(({ signals }) => signals.length > 0)).toEqual([
			...Array<boolean>(12).fill(false),
			true,
			true
		]);
		expect(points[12]?.signals.join('; ')).toContain('above the upper limit');
		expect(points[0]).toMatchObject({ inWindow: false, average: null, movingRange: null });
	});

	it('leaves out runs without a reading that counts', () => {
		const [first, ...rest] = runs(flow);
		expect(driftOf([{ ...(first as StockRun), values: [] }, ...rest]).points).toHaveLength(9);
	});

	it('says why there is no chart', () => {
		expect(driftOf(runs([50])).why).toContain('two runs');
		expect(driftOf(runs([50, 50, 50])).why).toContain('do not vary');
		expect(driftOf([]).points).toEqual([]);
	});

	it('keeps a window within what there is', () => {
		expect(fitWindow(20)).toEqual({ from: 1, to: 8 });
		expect(fitWindow(5)).toEqual({ from: 1, to: 5 });
		expect(fitWindow(5, { from: 9, to: 2 })).toEqual({ from: 4, to: 5 });
		expect(fitWindow(0)).toEqual({ from: 1, to: 2 });
	});
});

describe('a rig that was mended or revised', () => {
	it('is off up to the run after the one that came back: the average begins anew there', () => {
		const drift = driftOf(runs([...flow, 62, 63, 50, 50.5, 51]), { from: 1, to: 10 });
		expect(drift.points.map(({ begun }) => begun).slice(10)).toEqual([
			null,
			null,
			'average begun anew: back across the centre after a signal',
			null,
			null
		]);
		expect(offSpans(drift)).toEqual([expect.objectContaining({ from: at(11), to: at(14) })]);
	});

	it('begins its average anew with the first run of a new revision', () => {
		const taken = runs([...flow, 52, 52.5, 52, 51]).map((run, index) => ({
			...run,
			revision: index < 12 ? 1 : 2
		}));
		const { points } = driftOf(taken, { from: 1, to: 10 });
		expect(points[12]?.begun).toBe('average begun anew: the rig was revised');
		expect(points[12]?.average?.ewma).toBeCloseTo(0.2 * 52 + 0.8 * 50.81, 10);
		expect(points[13]?.begun).toBeNull();
	});
});

describe('a rig that was off', () => {
	const drift = driftOf(runs([...flow, 62, 63, 50, 50, 50, 50, 50, 50, 50, 50, 50]), { from: 1, to: 10 });

	it('was so from a run that signals to the next that does not', () => {
		const [span] = offSpans(drift);
		expect(span?.from).toBe(at(11));
		expect(spanAt(offSpans(drift), at(12))).toEqual(span);
		expect(spanAt(offSpans(drift), at(10))).toBeUndefined();
		expect(offSpans(driftOf(runs([...flow, 62]), { from: 1, to: 10 }))[0]?.to).toBeNull();
	});

	it('marks the cells that were measured meanwhile, whichever workload', () => {
		const stored = [50, 50.1, 49.9, 50.2, 50, 49.8, 50.1, 50, 56].map((mean, index) => ({
			id: index,
			rigSlug: 'n-12',
			rigName: 'N-12',
			revision: 1,
			campaign: 'stock-again',
			campaignName: 'Stock again',
			workload: 'tile-render',
			workloadName: 'Tile render',
			unit: 's',
			better: 'lower' as const,
			startedAt: new Date(at(index + 1)),
			values: [mean]
		}));
		const off = rigOff(driftFacts(stored), 1);
		const run = { profile: 'tuned', workload: 'sieve', voided: false };
		const cells = cellsOff(
			[
				{ ...run, startedAt: at(8) },
				{ ...run, workload: 'build', startedAt: at(10) },
				{ ...run, workload: 'walk', startedAt: at(10), voided: true }
			],
			off
		);
		expect(rigOff(driftFacts(stored), 2)).toEqual([]);
		expect(cells).toEqual([
			{
				profile: 'tuned',
				workload: 'build',
				words: expect.stringContaining('stock in Tile render on 2026-09-09')
			}
		]);
	});
});
