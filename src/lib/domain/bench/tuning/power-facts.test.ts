import { expect, it } from 'vitest';
import { powerFacts } from './power-facts';
import { fact } from './setting-fact.fixture';

const reference = fact({
	setting: 'Reference clock',
	quantity: 'reference-clock',
	unit: 'MHz',
	value: '100',
	stockValue: '100'
});
const ratio = (group: number, value: string, stockValue: string) =>
	fact({ setting: `Core group ${group} ratio`, quantity: 'core-ratio', value, stockValue });
const volts = (setting: string, value: string, stockValue: string) =>
	fact({ setting, quantity: 'core-voltage', unit: 'V', value, stockValue });

it('estimates each group that has a voltage of its own', () => {
	const found = powerFacts([
		reference,
		ratio(1, '52', '47'),
		ratio(2, '40', '40'),
		volts('Core group 1 voltage', '1.35', '1.20'),
		volts('Core group 2 voltage', '1.00', '1.00')
	]);
	// 1.20 → 1.35 V and 4.7 → 5.2 GHz: computed in the list of outside checks, 1.400265957447.
	expect(found).toMatchObject([{ name: 'Estimated dynamic power, Core group 1 ratio', decimals: 2 }]);
	expect(found[0]?.value).toBeCloseTo(1.400265957447, 10);
});

it('estimates nothing of several clocks under one voltage', () => {
	expect(
		powerFacts([reference, ratio(1, '52', '47'), ratio(2, '40', '38'), volts('Voltage', '1.35', '1.20')])
	).toEqual([]);
});
