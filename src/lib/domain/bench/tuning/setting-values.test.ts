import { describe, expect, it } from 'vitest';
import { fact } from './setting-fact.fixture';
import { asIn, ofGroup, single, valuesOf } from './setting-values';

const volts = (setting: string, value: string) =>
	fact({ setting, quantity: 'core-voltage', unit: 'V', value });
const settings = [volts('Group 1 voltage', '1.2'), volts('Group 2 voltage', '1.1'), volts('Voltage', '1.3')];

describe('values of settings', () => {
	it('are those with a number above zero', () => {
		const odd = [volts('a', 'Auto'), volts('b', '-0.05'), volts('c', '1250 mV'), fact({ value: '5' })];
		expect(valuesOf(odd, 'core-voltage').map(({ value }) => value)).toEqual([1.25]);
	});

	it('count as one only where set once', () => {
		expect(single(settings, 'core-voltage')).toBeNull();
		expect(single(settings.slice(0, 1), 'core-voltage')).toBe(1.2);
		expect(single([], 'core-voltage')).toBeNull();
	});

	it('are a group’s own, else those for all', () => {
		expect(ofGroup(settings, 'core-voltage', 2)).toBe(1.1);
		expect(ofGroup(settings, 'core-voltage', 3)).toBe(1.3);
		expect(ofGroup(settings.slice(0, 2), 'core-voltage', 3)).toBeNull();
		expect(ofGroup(settings, 'core-voltage', null)).toBeNull();
	});

	it('take the group a mapping gave over that of the name', () => {
		expect(valuesOf([{ ...volts('Group 1 voltage', '1.2'), group: 4 }], 'core-voltage')[0]?.group).toBe(4);
	});

	it('are read as the parent or stock has them', () => {
		const own = { ...volts('Voltage', '1.3'), parentValue: '1.25', stockValue: null };
		expect(single(asIn([own], 'parentValue'), 'core-voltage')).toBe(1.25);
		expect(asIn([own], 'stockValue')).toEqual([]);
	});
});
