import { describe, expect, it } from 'vitest';
import type { z } from 'zod';
import {
	attemptInput,
	attemptsInput,
	attemptsPerRequest,
	pointsPerPass,
	sweepInput,
	sweepPassInput
} from './stability';

const attempt = {
	stress: 'long-sums',
	clockMHz: '4900',
	volts: '1,25',
	durationMin: '30',
	outcome: 'passed'
};

/** Messages by path. */
function faults(schema: z.ZodType, sent: unknown): Record<string, string> {
	const parsed = schema.safeParse(sent);
	return Object.fromEntries((parsed.error?.issues ?? []).map((one) => [one.path.join('.'), one.message]));
}
const ofAttempt = (change: object) => faults(attemptInput, { ...attempt, ...change });

describe('an attempt', () => {
	it('is read as typed, with a decimal comma, and as JSON', () => {
		const typed = attemptInput.parse({ ...attempt, peakTempC: ' 84,5 ', packageW: '' });
		expect(typed).toMatchObject({
			clockMHz: 4900,
			volts: 1.25,
			durationMin: 30,
			failure: '',
			errors: 0,
			peakTempC: 84.5,
			packageW: null,
			ambientC: null,
			startedAt: null
		});
		expect(attemptInput.parse({ ...attempt, clockMHz: 4900, volts: 1.25, durationMin: 30 })).toMatchObject({
			clockMHz: 4900,
			volts: 1.25
		});
	});

	it('says what is wrong, beside its cause', () => {
		expect(ofAttempt({ clockMHz: '4.9' })).toEqual({
			clockMHz: 'The clock is from 100 to 12,000 MHz, such as 4900.'
		});
		expect(ofAttempt({ volts: '1250' })).toEqual({
			volts: 'The core voltage is from 0.3 to 2.5 V, such as 1.25.'
		});
		expect(ofAttempt({ volts: '1,250' })).toEqual({
			volts: '“1,250” can be read in two ways. Enter 1.250 or 1250.'
		});
		expect(ofAttempt({ volts: '1.23456' })).toEqual({ volts: 'Write at most 4 decimals.' });
		expect(ofAttempt({ volts: '' })).toEqual({ volts: 'Enter a number.' });
		expect(ofAttempt({ volts: null })).toHaveProperty('volts');
		expect(ofAttempt({ peakTempC: '84 °C' })).toHaveProperty('peakTempC');
		expect(ofAttempt({ clockMHz: NaN })).toHaveProperty('clockMHz');
		expect(ofAttempt({ outcome: 'well' })).toEqual({
			outcome: 'Say whether it passed, failed or was stopped.'
		});
		expect(ofAttempt({ startedAt: 'yesterday' })).toHaveProperty('startedAt');
	});

	it('holds outcome, failure, errors and time together', () => {
		expect(ofAttempt({ outcome: 'failed' })).toEqual({
			failure: 'Say what was seen, such as crash or error.'
		});
		expect(ofAttempt({ outcome: 'failed', failure: 'error', errors: '3', durationMin: 0 })).toEqual({});
		expect(ofAttempt({ failure: 'crash' })).toHaveProperty('failure');
		expect(ofAttempt({ errors: 2 })).toHaveProperty('errors');
		expect(ofAttempt({ outcome: 'failed', failure: 'error', errors: 1.5 })).toEqual({
			errors: 'Write a whole number.'
		});
		expect(ofAttempt({ durationMin: '0' })).toEqual({ durationMin: 'Say for how long it passed.' });
		expect(ofAttempt({ outcome: 'stopped', durationMin: '0' })).toEqual({});
	});

	it('comes alone or in hundreds', () => {
		const many = (n: number) => ({ attempts: Array.from({ length: n }, () => attempt) });
		expect(faults(attemptsInput, many(0))).toEqual({ attempts: 'Send at least one attempt.' });
		expect(faults(attemptsInput, many(attemptsPerRequest))).toEqual({});
		expect(faults(attemptsInput, many(attemptsPerRequest + 1))).toHaveProperty('attempts');
		expect(faults(attemptsInput, { attempts: [attempt, { ...attempt, volts: 'x' }] })).toHaveProperty([
			'attempts.1.volts'
		]);
	});
});

describe('a pass of a sweep', () => {
	const points = [
		{ threads: '1', currentA: '24,5', clockMHz: '5450' },
		{ threads: '2', currentA: '39', clockMHz: '5425' },
		{ threads: '4', currentA: '66', clockMHz: '5,325e3' }
	];

	it('is read as typed', () => {
		expect(sweepPassInput.parse({ points })).toMatchObject({
			points: [
				{ threads: 1, currentA: 24.5, clockMHz: 5450 },
				{ threads: 2, currentA: 39, clockMHz: 5425 },
				{ threads: 4, currentA: 66, clockMHz: 5325 }
			],
			sure: false
		});
	});

	it('asks about a value a thousand times off, and takes it when a person is sure', () => {
		const off = points.map((point, row) => (row === 1 ? { ...point, clockMHz: '5.425' } : point));
		const asked = sweepPassInput.safeParse({ points: off });
		expect(asked.error?.issues).toMatchObject([
			{ path: ['points', 1, 'clockMHz'], params: { asked: true, meant: 5425 } }
		]);
		expect(sweepPassInput.parse({ points: off, sure: true }).points[1]?.clockMHz).toBe(5.425);
	});

	it('refuses what is wrong, sure or not', () => {
		const twice = points.map((point) => ({ ...point, threads: '1' }));
		expect(faults(sweepPassInput, { points: twice, sure: true })).toHaveProperty(['points.1.threads']);
		expect(faults(sweepPassInput, { points: points.slice(0, 1) })).toHaveProperty('points');
		expect(
			faults(sweepPassInput, { points: Array.from({ length: pointsPerPass + 1 }, () => points[0]) })
		).toHaveProperty('points');
		expect(faults(sweepPassInput, { points: [{ ...points[0], currentA: '-3' }, points[1]] })).toHaveProperty([
			'points.0.currentA'
		]);
	});

	it('refuses a pass at one current alone, which no line can be drawn through', () => {
		const level = points.map((point) => ({ ...point, currentA: '66' }));
		expect(faults(sweepPassInput, { points: level, sure: true })).toEqual({
			points: 'All points have the same current, so no switch point can be told. Check the currents.'
		});
	});

	it('comes in passes', () => {
		expect(sweepInput.parse({ passes: [{ points }, { points }] }).passes).toHaveLength(2);
		expect(faults(sweepInput, { passes: [] })).toEqual({ passes: 'Send at least one pass.' });
	});
});
