import { describe, expect, it } from 'vitest';
import { attempt } from './attempt.fixture';
import { contradictions } from './contradictions';

const demands = { 'long-sums': 30, 'short-sums': 10 };
const words = (...attempts: Parameters<typeof contradictions>[0]) =>
	contradictions(attempts, demands).map((one) => one.words.replaceAll('\u00a0', ' '));
const fail = (given: Parameters<typeof attempt>[0]) =>
	attempt({ outcome: 'failed', durationMin: 3, ...given });

describe('contradictions', () => {
	it('a pass above a fail at the same voltage, in the order they happened', () => {
		const failed = fail({ clockMHz: 4900, at: '2026-11-11T09:00:00Z' });
		expect(words(failed, attempt({ clockMHz: 4950 }))).toEqual([
			'passed 4950 MHz at 1.25 V after failing 4900 MHz at 1.25 V'
		]);
		expect(words(failed, attempt({ clockMHz: 4950, at: '2026-11-10T09:00:00Z' }))).toEqual([
			'passed 4950 MHz at 1.25 V before failing 4900 MHz at 1.25 V'
		]);
	});

	it('the same setting both ways, and the same clock with less voltage', () => {
		expect(words(fail({}), attempt())).toHaveLength(1);
		expect(words(fail({}), attempt({ volts: 1.2 }))).toHaveLength(1);
	});

	it('none where more voltage explains it', () => {
		expect(words(fail({ clockMHz: 4900, volts: 1.2 }), attempt({ clockMHz: 4950, volts: 1.25 }))).toEqual([]);
	});

	it('none from a short pass, a stop or another stress', () => {
		const failed = fail({ clockMHz: 4700 });
		expect(
			words(
				failed,
				attempt({ durationMin: 10 }),
				attempt({ outcome: 'stopped' }),
				attempt({ stress: 'short-sums' })
			)
		).toEqual([]);
	});

	it('names one fail for each pass: the lowest clock, the highest voltage there', () => {
		const [one, ...others] = contradictions(
			[
				attempt({ clockMHz: 5000 }),
				fail({ clockMHz: 4950 }),
				fail({ clockMHz: 4900 }),
				fail({ clockMHz: 4900, volts: 1.3 })
			],
			demands
		);
		expect(others).toEqual([]);
		expect(one?.failed).toMatchObject({ clockMHz: 4900, volts: 1.3 });
	});
});
