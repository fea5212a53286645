import { describe, expect, it } from 'vitest';
import { attemptWords, settingWords } from './attempt';
import { attempt } from './attempt.fixture';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('an attempt in words', () => {
	it('says setting, outcome, time and cause', () => {
		expect(
			plain(
				attemptWords(
					attempt({ clockMHz: 4900, outcome: 'failed', durationMin: 12, failure: 'error', errors: 3 })
				)
			)
		).toBe('4900 MHz at 1.25 V: failed after 12 min, error (3 counted)');
		expect(
			plain(attemptWords(attempt({ outcome: 'failed', failure: 'did not start', durationMin: 0 })))
		).toBe('4800 MHz at 1.25 V: failed after 0 min, did not start');
		expect(plain(attemptWords(attempt({ outcome: 'stopped', durationMin: 7.5 })))).toBe(
			'4800 MHz at 1.25 V: stopped by hand after 7.5 min'
		);
	});

	it('a clock with its voltage', () => {
		expect(plain(settingWords({ clockMHz: 5025, volts: 1.235 }))).toBe('5025 MHz at 1.235 V');
	});
});
