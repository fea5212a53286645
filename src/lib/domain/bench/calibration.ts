import { DateTime } from 'luxon';

export type CalibrationState = 'never' | 'valid' | 'overdue';

export interface Calibrated {
	/** ISO days; null where there is none. */
	calibratedOn: string | null;
	calibrationDueOn: string | null;
}

/** Whether an instrument's calibration holds on a day: through the day it is due, and for good where none is due. */
export function calibrationState(instrument: Calibrated, today: string): CalibrationState {
	const { calibratedOn, calibrationDueOn } = instrument;
	if (calibrationDueOn !== null && calibrationDueOn < today) return 'overdue';
	return calibratedOn === null ? 'never' : 'valid';
}

const inWords = (day: string): string => DateTime.fromISO(day).setLocale('en-GB').toFormat('d LLLL yyyy');

/** @example calibrationWords({ calibratedOn: '2026-01-12', calibrationDueOn: '2027-01-12' }, '2026-11-11') // 'calibrated 12 January 2026, due 12 January 2027' */
export function calibrationWords(instrument: Calibrated, today: string): string {
	const due = instrument.calibrationDueOn === null ? null : inWords(instrument.calibrationDueOn);
	const state = calibrationState(instrument, today);
	if (state === 'overdue') return `calibration overdue since ${due}`;
	if (instrument.calibratedOn === null)
		return due === null ? 'never calibrated' : `to be calibrated by ${due}`;
	const calibrated = `calibrated ${inWords(instrument.calibratedOn)}`;
	return due === null ? calibrated : `${calibrated}, due ${due}`;
}
