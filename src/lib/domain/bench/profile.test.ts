import { describe, expect, it } from 'vitest';
import { chainTo, effectiveSettings, menusOf, type OwnSetting } from './profile';

const own = (menuPath: string, setting: string, value: string, unit = ''): OwnSetting => ({
	menuPath,
	setting,
	value,
	unit,
	quantity: 'other',
	note: ''
});

const stock = {
	settings: [
		own('Tuning > Clocks', 'Core ratio', '47'),
		own('Tuning > Power', 'Core voltage', '1.20', 'V'),
		own('Cooling', 'Fans', 'Auto')
	]
};
const tuned = {
	settings: [
		own('Tuning > Clocks', 'Core ratio', '50'),
		own('Tuning > Clocks', 'Reference clock', '100', 'MHz')
	]
};
const further = {
	settings: [
		own('Tuning>Clocks', 'Core ratio ', '52'),
		own('Tuning > Power', 'Core voltage', '1350', 'mV'),
		own('Storage', 'Cache', 'On')
	]
};

const lines = (chain: Parameters<typeof effectiveSettings>[0]) =>
	effectiveSettings(chain).map(({ setting, value, parentValue, stockValue }) => [
		setting.trim(),
		value,
		parentValue,
		stockValue
	]);

describe('settings that hold under a profile', () => {
	it('are stock’s own for stock', () => {
		expect(lines([stock])).toEqual([
			['Core ratio', '47', null, '47'],
			['Core voltage', '1.20', null, '1.20'],
			['Fans', 'Auto', null, 'Auto']
		]);
	});

	it('keep their place when changed, and join their menu when added', () => {
		expect(lines([stock, tuned])).toEqual([
			['Core ratio', '50', '47', '47'],
			['Reference clock', '100', null, null],
			['Core voltage', '1.20', '1.20', '1.20'],
			['Fans', 'Auto', 'Auto', 'Auto']
		]);
	});

	it('look to parent and to stock, whatever the spacing of a menu, with the unit where it is another', () => {
		expect(lines([stock, tuned, further])).toEqual([
			['Core ratio', '52', '50', '47'],
			['Reference clock', '100', '100', null],
			['Core voltage', '1350', '1.20 V', '1.20 V'],
			['Fans', 'Auto', 'Auto', 'Auto'],
			['Cache', 'On', null, null]
		]);
	});

	it('are none for an empty chain', () => {
		expect(effectiveSettings([])).toEqual([]);
	});
});

describe('the chain to stock', () => {
	const profiles = [
		{ id: 3, parentId: 2 },
		{ id: 1, parentId: null },
		{ id: 2, parentId: 1 }
	];

	it('runs from stock to the profile', () => {
		expect(chainTo(profiles, 3).map(({ id }) => id)).toEqual([1, 2, 3]);
		expect(chainTo(profiles, 1).map(({ id }) => id)).toEqual([1]);
	});

	it('refuses a missing parent and a ring', () => {
		expect(() => chainTo([{ id: 2, parentId: 1 }], 2)).toThrow(RangeError);
		expect(() =>
			chainTo(
				[
					{ id: 1, parentId: 2 },
					{ id: 2, parentId: 1 }
				],
				2
			)
		).toThrow(RangeError);
	});
});

it('reads menus from the outermost in', () => {
	expect(menusOf('Tuning > Clocks')).toEqual(['Tuning', 'Clocks']);
	expect(menusOf(' ')).toEqual([]);
});
