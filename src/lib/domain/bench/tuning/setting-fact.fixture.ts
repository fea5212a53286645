import type { SettingFact } from '../../articles/data';

/** A setting for the tests: what a test does not name is as plain as can be. */
export const fact = (given: Partial<SettingFact>): SettingFact => ({
	menuPath: 'Tuning > Clocks',
	setting: 'Core ratio',
	value: '47',
	unit: '',
	quantity: 'other',
	note: '',
	parentValue: null,
	stockValue: null,
	...given
});
