import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attempt, tried } from './attempt.fixture';
import { type Climb, nextAttempt } from './next-attempt';

const climb = (given: Partial<Climb> = {}): Climb => ({
	attempts: [],
	stress: 'long-sums',
	demands: { 'long-sums': 30 },
	volts: 1.25,
	stepMHz: 25,
	strideMHz: 100,
	startMHz: 4500,
	limits: { clockMHz: 5400, volts: 1.35, tempC: 95, source: 'rule of the lab' },
	...given
});
const next = (given: Partial<Climb>) => {
	const answer = nextAttempt(climb(given));
	return { ...answer, words: answer.words.replaceAll('\u00a0', ' ') };
};

// The procedure is bisection; strides and headroom are common practice, no source.
describe('the next attempt', () => {
	it('begins where it is told', () => {
		expect(next({})).toMatchObject({ kind: 'try', clockMHz: 4500, volts: 1.25 });
	});

	it('goes up while nothing has failed, also from less voltage', () => {
		expect(next({ attempts: tried([4500, 4600], []) })).toMatchObject({ kind: 'try', clockMHz: 4700 });
		const { words } = next({ attempts: tried([4600], [], 1.2) });
		expect(words).toBe(
			'Nothing has failed yet: up from 4600 MHz at 1.2 V, which passed. No temperature is known up to here: watch it.'
		);
	});

	it('goes down while nothing has passed', () => {
		expect(next({ attempts: tried([], [4500]) })).toMatchObject({ kind: 'try', clockMHz: 4400 });
		expect(next({ attempts: tried([], [100]) })).toMatchObject({ kind: 'done', passedMHz: null });
	});

	it('halves what lies between, in the steps of the board', () => {
		const answer = next({ attempts: tried([4700], [4900]) });
		expect(answer).toMatchObject({ kind: 'try', clockMHz: 4800 });
		expect(answer.words).toMatch(
			/^Half way between 4700 MHz at 1.25 V, which passed, and 4900 MHz at 1.25 V, which failed\./
		);
		expect(next({ attempts: tried([4700], [4775]) })).toMatchObject({ kind: 'try', clockMHz: 4725 });
		expect(next({ attempts: tried([4700], [4740]) })).toMatchObject({ kind: 'try', clockMHz: 4725 });
	});

	it('is done when the gap is one step', () => {
		expect(next({ attempts: tried([4700], [4725]) })).toEqual({
			kind: 'done',
			passedMHz: 4700,
			failedMHz: 4725,
			words:
				'Done at 1.25 V: 4700 MHz at 1.25 V passed, 4725 MHz at 1.25 V failed, and the board has no step between.'
		});
	});

	it('asks for a short pass again, at its full length', () => {
		const attempts = [...tried([4700], [4900]), attempt({ clockMHz: 4800, durationMin: 10 })];
		expect(next({ attempts })).toMatchObject({ kind: 'try', clockMHz: 4800 });
		expect(next({ attempts }).words).toContain('not for as long as the stress demands');
	});

	it('lets a fail outrank a pass above it, and says so', () => {
		const { words, ...answer } = next({ attempts: tried([4700, 4950], [4900]) });
		expect(answer).toMatchObject({ kind: 'try', clockMHz: 4800 });
		expect(words).toContain('A pass above 4900 MHz at 1.25 V is left out');
	});

	it('stays under the limit of the clock, then refuses by whose limit', () => {
		const limits = { ...climb().limits, clockMHz: 4760 };
		const capped = next({ attempts: tried([4700], []), limits });
		expect(capped).toMatchObject({ kind: 'try', clockMHz: 4750 });
		expect(capped.words).toContain('Kept under the limit of 4760 MHz (rule of the lab).');
		const refused = next({ attempts: tried([4750], []), limits });
		expect(refused).toMatchObject({ kind: 'refused', limit: 'clock' });
		expect(refused.words).toContain('4760 MHz (rule of the lab)');
		expect(next({ startMHz: 4800, limits })).toMatchObject({ kind: 'refused', limit: 'clock' });
		expect(next({ attempts: tried([], [5000]), limits })).toMatchObject({ kind: 'try', clockMHz: 4750 });
	});

	it('refuses a voltage over the limit', () => {
		expect(next({ volts: 1.4 })).toEqual({
			kind: 'refused',
			limit: 'voltage',
			words: '1.4 V is over the limit of 1.35 V (rule of the lab). Choose a lower voltage.'
		});
		expect(next({ volts: 1.35 })).toMatchObject({ kind: 'try' });
	});

	it('refuses where a cooler attempt was already too near the limit of temperature', () => {
		const at = (peakTempC: number) => next({ attempts: [attempt({ clockMHz: 4700, peakTempC })] });
		expect(at(89.9)).toMatchObject({ kind: 'try', clockMHz: 4800 });
		expect(at(90)).toEqual({
			kind: 'refused',
			limit: 'temperature',
			words:
				'4700 MHz at 1.25 V already reached 90 °C. The limit is 95 °C (rule of the lab), of which 5 K are kept free. Lower the voltage or cool better before 4800 MHz.'
		});
	});

	it('may go below what was too hot', () => {
		const attempts = [attempt({ clockMHz: 4700, outcome: 'failed', failure: 'too hot', peakTempC: 97 })];
		expect(next({ attempts })).toMatchObject({ kind: 'try', clockMHz: 4600 });
	});

	it('refuses settings that are not above zero', () => {
		expect(() => nextAttempt(climb({ stepMHz: 0 }))).toThrow(RangeError);
		expect(() => nextAttempt(climb({ volts: -1 }))).toThrow(RangeError);
	});

	it('halves in no more steps than the logarithm, on the board’s grid', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 1, max: 400 }),
				fc.integer({ min: 0, max: 399 }),
				fc.constantFrom(25, 33.3, 100),
				(steps, least, stepMHz) => {
					const ceiling = 1000 + Math.min(least, steps - 1) * stepMHz;
					const attempts = tried([1000], [1000 + steps * stepMHz]);
					const given = { attempts, stepMHz, limits: { ...climb().limits, clockMHz: 1e6 } };
					let asked = 0;
					for (let answer = next(given); answer.kind === 'try'; answer = next(given)) {
						asked += 1;
						expect(asked).toBeLessThanOrEqual(Math.ceil(Math.log2(steps)));
						attempts.push(
							...(answer.clockMHz <= ceiling + 1e-3
								? tried([answer.clockMHz], [])
								: tried([], [answer.clockMHz]))
						);
					}
					expect(next(given)).toMatchObject({
						kind: 'done',
						passedMHz: expect.closeTo(ceiling, 3) as number
					});
				}
			)
		);
	});

	it('never proposes over a limit', () => {
		const clocks = fc.array(fc.integer({ min: 1, max: 240 }).map((n) => 25 * n));
		fc.assert(
			fc.property(
				clocks,
				clocks,
				fc.integer({ min: 100, max: 6000 }),
				fc.integer({ min: 100, max: 6000 }),
				fc.double({ min: 0.8, max: 1.6, noNaN: true }),
				(passes, fails, clockMHz, startMHz, volts) => {
					const limits = { ...climb().limits, clockMHz };
					const answer = next({ attempts: tried(passes, fails, volts), limits, startMHz, volts });
					if (volts > limits.volts) expect(answer).toMatchObject({ kind: 'refused', limit: 'voltage' });
					if (answer.kind === 'try') {
						expect(answer.clockMHz).toBeLessThanOrEqual(clockMHz);
						expect(answer.clockMHz).toBeGreaterThan(0);
					}
				}
			)
		);
	});
});
