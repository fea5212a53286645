import { describe, expect, it } from 'vitest';
import { attempt, tried } from './attempt.fixture';
import { ladderOf, onALine } from './ladder.fixture';
import { ladderReport } from './ladder-report';
import { stressPower } from './stress-power';

describe('what a ladder says', () => {
	it('is told for every stress, in the ladder’s order, tried or not', () => {
		const { stresses, kinds } = ladderReport(ladderOf(tried([4800], [4900])));
		expect(stresses.map((one) => one.stress.slug)).toEqual(['long-sums', 'tile-render']);
		expect(kinds.heaviest).toMatchObject({ clockMHz: 4800, lowestFailedMHz: 4900 });
		expect(kinds.everyday.clockMHz).toBeNull();
		expect(stresses[1]).toMatchObject({ result: { passed: null }, proof: null });
	});

	it('proposes at the voltage of the last attempt, or at the one asked for', () => {
		const ladder = ladderOf(tried([4800], [4900]));
		expect(ladderReport(ladder).stresses[0]).toMatchObject({
			nextVolts: 1.25,
			next: { kind: 'try', clockMHz: 4850, volts: 1.25 }
		});
		// Nothing failed with 1.28 V or more: up from 4800 by four steps of 25.
		expect(ladderReport(ladder, { volts: 1.28 }).stresses[0]?.next).toMatchObject({
			kind: 'try',
			clockMHz: 4900
		});
		expect(ladderReport(ladder, { volts: 1.31 }).stresses[0]?.next).toMatchObject({
			kind: 'refused',
			limit: 'voltage'
		});
	});

	it('begins where the profile stands, and proposes nothing where it names no setting', () => {
		const start = { clockMHz: 4400, volts: 1.17 };
		expect(ladderReport(ladderOf([]), { start }).stresses[0]?.next).toMatchObject({ kind: 'try', ...start });
		expect(ladderReport(ladderOf([])).stresses[0]).toMatchObject({ next: null, nextVolts: null });
	});

	it('says what half an hour without a failure proves', () => {
		const { stresses } = ladderReport(ladderOf([attempt()]));
		// −ln 0.05 ÷ 0.5 h is 5.99 an hour: one in 10 min (the rule of three, exactly).
		expect(stresses[0]?.proof?.replaceAll('\u00a0', ' ')).toBe(
			'4800 MHz at 1.25 V: 0.5 h without a failure: with 95 % confidence fewer than one failure in 10 min. It does not prove that there is none.'
		);
	});

	it('names attempts that cannot both be right', () => {
		const both = [attempt({ outcome: 'failed' }), attempt({ at: '2026-11-11T11:00:00Z' })];
		expect(ladderReport(ladderOf(both)).contradictions).toHaveLength(1);
	});
});

describe('power of a stress', () => {
	it('finds the line that the points lie on', () => {
		const { fit, residuals } = stressPower(onALine, 'long-sums');
		expect(fit?.baseW).toBeCloseTo(40, 9);
		expect(fit?.wPerV2GHz).toBeCloseTo(22, 9);
		for (const one of residuals) expect(one.residualW).toBeCloseTo(0, 9);
	});

	it('says why where there is no line', () => {
		expect(stressPower(onALine, 'tile-render').why).toContain('there are 0');
		expect(stressPower(onALine.slice(0, 1), 'long-sums').why).toContain('there is 1');
		const stopped = onALine.map((one) => ({ ...one, outcome: 'stopped' as const }));
		expect(stressPower(stopped, 'long-sums').fit).toBeNull();
	});
});
