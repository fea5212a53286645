import { describe, expect, it } from 'vitest';
import { calibrationState, calibrationWords } from './calibration';

// Common practice, no source: a calibration holds through the day it is due.
describe('an instrument’s calibration', () => {
	const meter = { calibratedOn: '2026-01-12', calibrationDueOn: '2027-01-12' };

	it.each([
		['2027-01-11', 'valid'],
		['2027-01-12', 'valid'],
		['2027-01-13', 'overdue']
	])('on %s is %s', (today, state) => expect(calibrationState(meter, today)).toBe(state));

	it('is said in words', () => {
		expect(calibrationWords(meter, '2026-11-11')).toBe('calibrated 12 January 2026, due 12 January 2027');
		expect(calibrationWords(meter, '2027-02-01')).toBe('calibration overdue since 12 January 2027');
		expect(calibrationWords({ calibratedOn: '2026-01-12', calibrationDueOn: null }, '2030-01-01')).toBe(
			'calibrated 12 January 2026'
		);
		expect(calibrationWords({ calibratedOn: null, calibrationDueOn: null }, '2030-01-01')).toBe(
			'never calibrated'
		);
		expect(calibrationWords({ calibratedOn: null, calibrationDueOn: '2030-02-01' }, '2030-01-01')).toBe(
			'to be calibrated by 1 February 2030'
		);
	});
});
