import { describe, expect, it } from 'vitest';
import { asStock, hasUnits, settingNumber } from './setting-number';
import { fact } from './setting-fact.fixture';

describe('the number of a setting', () => {
	it.each([
		['core-voltage', '1.24', 'V', 1.24],
		['core-voltage', '1240', 'mV', 1.24],
		['core-voltage', '1,24 V', '', 1.24],
		['core-clock', '5.2', 'GHz', 5200],
		['core-ratio', '49.5', '×', 49.5],
		['core-ratio', 'x52', '', 52],
		['memory-data-rate', '6000 MT/s', '', 6000],
		['cas-latency', 'CL30', '', 30],
		['power-limit', '253', 'W', 253],
		['temperature-limit', '95', '°C', 95],
		['current-limit', '400', 'A', 400]
	] as const)('%s %s %s', (quantity, value, unit, expected) => {
		expect(settingNumber(quantity, value, unit)).toEqual({
			value: expect.closeTo(expected, 10) as unknown,
			offset: false
		});
	});

	it('tells an offset by its sign', () => {
		expect(settingNumber('core-voltage', '-50', 'mV')).toEqual({ value: -0.05, offset: true });
		expect(settingNumber('core-voltage', '\u221250', 'mV')).toEqual({ value: -0.05, offset: true });
		expect(settingNumber('core-voltage', '+0.02 V', '')).toEqual({ value: 0.02, offset: true });
	});

	it.each([
		['core-voltage', 'Auto', 'V'],
		['core-voltage', '1.24', ''],
		['core-voltage', '1.24', 'W'],
		['memory-data-rate', '6000', 'MHz'],
		['load-line', 'Level 3', ''],
		['other', '5', ''],
		['core-ratio', '', '']
	] as const)('guesses nothing from %s %j %j', (quantity, value, unit) => {
		expect(settingNumber(quantity, value, unit)).toBeNull();
	});

	it('knows what is written with a unit', () => {
		expect([hasUnits('core-voltage'), hasUnits('load-line'), hasUnits('other')]).toEqual([
			true,
			false,
			false
		]);
	});

	it('compares with stock by number where there is one', () => {
		const volts = { quantity: 'core-voltage', unit: 'V' } as const;
		expect(asStock(fact({ ...volts, value: '1.240', stockValue: '1.24' }))).toBe(true);
		expect(asStock(fact({ ...volts, value: '1.24', stockValue: '1240 mV' }))).toBe(true);
		expect(asStock(fact({ ...volts, value: '+1.24', stockValue: '1.24' }))).toBe(false);
		expect(asStock(fact({ value: 'On', stockValue: 'Off' }))).toBe(false);
		expect(asStock(fact({ value: 'On', stockValue: null }))).toBe(false);
	});
});
