import { describe, expect, it } from 'vitest';
import { coreClocks, coreFacts } from './core-facts';
import { fact } from './setting-fact.fixture';

const reference = fact({
	setting: 'Reference clock',
	quantity: 'reference-clock',
	unit: 'MHz',
	value: '100',
	stockValue: '100'
});
const ratio = (setting: string, value: string, stockValue: string | null = null, menuPath = 'Tuning') =>
	fact({ menuPath, setting, quantity: 'core-ratio', value, stockValue, parentValue: stockValue });

describe('clocks of several chiplets or core groups', () => {
	// 100 MHz × 36 = 3.6 GHz and 100 × 46 = 4.6 GHz: public worked examples.
	const two = [reference, ratio('Chiplet 1 ratio', '46', '40'), ratio('Chiplet 2 ratio', '36', '36')];

	it('are told one by one, then the fastest, the slowest and the spread', () => {
		expect(coreFacts(two).map(({ name, value, unit }) => [name, Number(value.toFixed(9)), unit])).toEqual([
			['Core clock, Chiplet 1 ratio', 4600, 'MHz'],
			['Core clock, Chiplet 1 ratio over stock', 15, '%'],
			['Core clock, Chiplet 2 ratio', 3600, 'MHz'],
			['Fastest core clock', 4600, 'MHz'],
			['Slowest core clock', 3600, 'MHz'],
			['Spread of core clocks', 1000, 'MHz']
		]);
		expect(coreFacts(two).at(-1)?.how).toBe('Fastest − slowest: 4600 MHz − 3600 MHz');
	});

	it('have a spread of nought where they run alike', () => {
		const alike = [reference, ratio('Chiplet 1 ratio', '46'), ratio('Chiplet 2 ratio', '46')];
		expect(coreFacts(alike).at(-1)).toMatchObject({ name: 'Spread of core clocks', value: 0, decimals: 0 });
		expect(coreFacts(alike)).toHaveLength(3);
	});

	it('are told apart by their menus where their settings have one name', () => {
		const found = coreClocks([
			reference,
			ratio('Ratio', '46', null, 'Tuning > Chiplet 1'),
			ratio('Ratio', '36', null, 'Tuning > Chiplet 2')
		]);
		expect(found.map(({ label, group, mhz }) => [label, group, mhz])).toEqual([
			['Ratio (Chiplet 1)', 1, 4600],
			['Ratio (Chiplet 2)', 2, 3600]
		]);
	});

	it('stand over their own group’s reference clock where it has one', () => {
		// 200 MHz × 13 = 2.6 GHz: a public worked example.
		const own = fact({
			menuPath: 'Chiplet 2',
			setting: 'Reference',
			quantity: 'reference-clock',
			unit: 'MHz',
			value: '200'
		});
		const found = coreClocks([
			reference,
			own,
			ratio('Chiplet 1 ratio', '36'),
			ratio('Chiplet 2 ratio', '13')
		]);
		expect(found.map(({ mhz }) => mhz)).toEqual([3600, 2600]);
	});
});
