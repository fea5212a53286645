import { describe, expect, it } from 'vitest';
import type { SettingFact } from '../../articles/data';
import { derivedFacts } from './derive';
import { fact } from './setting-fact.fixture';

const reference = fact({
	setting: 'Reference clock',
	quantity: 'reference-clock',
	unit: 'MHz',
	value: '100',
	parentValue: '100',
	stockValue: '100'
});
const ratio = fact({
	setting: 'Core ratio',
	quantity: 'core-ratio',
	value: '52',
	parentValue: '47',
	stockValue: '47'
});
const volts = fact({
	setting: 'Core voltage',
	quantity: 'core-voltage',
	unit: 'V',
	value: '1.35',
	parentValue: '1.20',
	stockValue: '1.20'
});
const memory = [
	fact({ setting: 'Memory data rate', quantity: 'memory-data-rate', unit: 'MT/s', value: '6000' }),
	fact({ setting: 'CAS latency', quantity: 'cas-latency', value: '30' }),
	fact({ setting: 'Controller clock', quantity: 'memory-controller-clock', unit: 'MHz', value: '3000' }),
	fact({ setting: 'Fabric clock', quantity: 'fabric-clock', unit: 'MHz', value: '2000' })
];

const values = (settings: SettingFact[]) =>
	Object.fromEntries(
		derivedFacts(settings).map(({ name, value, unit }) => [
			name,
			`${Number(value.toPrecision(10))} ${unit}`.trim()
		])
	);

describe('derived facts', () => {
	it('computes clock, change and dynamic power', () => {
		// 1.20 → 1.35 V and 4.7 → 5.2 GHz: computed in the list of outside checks, 1.400265957447.
		expect(values([reference, ratio, volts])).toEqual({
			'Core clock': '5200 MHz',
			'Core clock over stock': '10.63829787 %',
			'Estimated dynamic power': '1.400265957 × stock'
		});
	});

	it('computes memory as published tables do', () => {
		// 6000 MT/s CL30: 10 ns to the first word, 48,000 MB/s a module; 1:1 with a 3000 MHz controller.
		expect(values(memory)).toEqual({
			'Memory clock': '3000 MHz',
			'Memory clock period': '0.3333333333 ns',
			'First-word latency': '10 ns',
			'Peak bandwidth of a module': '48000 MB/s',
			'Memory clock to controller clock': '1',
			'Fabric clock to memory clock': '0.6666666667',
			'Fabric to controller to memory clock': '0.6666666667'
		});
		const how = derivedFacts(memory)
			.slice(-3, -1)
			.map((derived) => derived.how);
		expect(how).toEqual(['3000 MHz ÷ 3000 MHz; synchronous', '2000 MHz ÷ 3000 MHz; not synchronous']);
	});

	it('compares with the parent where that is not stock', () => {
		const facts = values([reference, { ...ratio, parentValue: '50' }]);
		expect(facts['Core clock over the parent profile']).toBe('4 %');
	});

	it('says nothing of stock against itself', () => {
		const own = [reference, ratio, volts].map((setting) => ({
			...setting,
			value: setting.stockValue ?? '',
			parentValue: null
		}));
		expect(values(own)).toEqual({ 'Core clock': '4700 MHz' });
	});

	it('names the clock of each setting where there are several', () => {
		const efficient = {
			...ratio,
			setting: 'Efficient core ratio',
			value: '40',
			stockValue: '40',
			parentValue: '40'
		};
		expect(Object.keys(values([reference, ratio, efficient, volts]))).toEqual([
			'Core clock, Core ratio',
			'Core clock, Core ratio over stock',
			'Core clock, Efficient core ratio',
			'Fastest core clock',
			'Slowest core clock',
			'Spread of core clocks'
		]);
	});

	it('guesses nothing', () => {
		expect(derivedFacts([ratio])).toEqual([]);
		expect(derivedFacts([reference, { ...ratio, value: 'Auto' }])).toEqual([]);
		expect(values([reference, ratio, { ...volts, stockValue: 'Auto' }])).not.toHaveProperty(
			'Estimated dynamic power'
		);
		expect(values([reference, ratio, { ...volts, value: '-0.05' }])).not.toHaveProperty(
			'Estimated dynamic power'
		);
		expect(derivedFacts([])).toEqual([]);
	});
});
