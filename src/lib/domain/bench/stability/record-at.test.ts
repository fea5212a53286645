import { expect, it } from 'vitest';
import { attempt } from './attempt.fixture';
import { recordAt } from './record-at';

// By hand: 30 + 60 + 15 + 3 min at the setting.
it('sums the time and the failed attempts of a setting', () => {
	const attempts = [
		attempt(),
		attempt({ durationMin: 60, stress: 'wide-sums' }),
		attempt({ durationMin: 15, outcome: 'stopped' }),
		attempt({ durationMin: 3, outcome: 'failed', errors: 12 }),
		attempt({ clockMHz: 4900, durationMin: 600 }),
		attempt({ volts: 1.2, durationMin: 600 })
	];
	expect(recordAt(attempts, { clockMHz: 4800, volts: 1.25 })).toEqual({
		hours: 1.8,
		failures: 1,
		attempts: 4
	});
	expect(recordAt(attempts, { clockMHz: 5000, volts: 1.25 })).toEqual({ hours: 0, failures: 0, attempts: 0 });
});
