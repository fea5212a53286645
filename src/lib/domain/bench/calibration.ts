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

/** @example calibrationWords({ calibratedOn: '2026-01-12', calibrationDueOn: '2027-01-12' }, '2026-11-11') // 'calibrated 2026-01-12, due 2027-01-12' */
export function calibrationWords(instrument: Calibrated, today: string): string {
	const { calibratedOn, calibrationDueOn } = instrument;
	const state = calibrationState(instrument, today);
	if (state === 'overdue') return `calibration overdue since ${calibrationDueOn}`;
	if (state === 'never')
		return calibrationDueOn === null ? 'never calibrated' : `to be calibrated by ${calibrationDueOn}`;
	return calibrationDueOn === null
		? `calibrated ${calibratedOn}`
		: `calibrated ${calibratedOn}, due ${calibrationDueOn}`;
}
