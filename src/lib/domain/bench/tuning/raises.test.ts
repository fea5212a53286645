import { describe, expect, it } from 'vitest';
import { raiseOf, raises } from './raises';
import { fact } from './setting-fact.fixture';

const volts = (value: string, stockValue: string | null) =>
	fact({ setting: 'Core voltage', quantity: 'core-voltage', unit: 'V', value, stockValue });

describe('what a profile raises over stock', () => {
	it('says by how much', () => {
		expect(raiseOf(volts('1.272', '1.2'))).toEqual({
			topic: 'voltage',
			menuPath: 'Tuning > Clocks',
			setting: 'Core voltage',
			quantity: 'core-voltage',
			from: '1.2 V',
			to: '1.272 V',
			byPercent: expect.closeTo(6, 9) as unknown
		});
	});

	it.each([
		['lower', volts('1.1', '1.2')],
		['the same', volts('1.20', '1.2')],
		['left to the maker', volts('Auto', '1.2')],
		['an offset down', volts('-0.05', '1.2')],
		['an offset down, stock silent', volts('-0.05', null)],
		['an offset less than stock’s', volts('+0.01', '+0.02')],
		[
			'a lower temperature limit',
			fact({ quantity: 'temperature-limit', unit: '°C', value: '85', stockValue: '95' })
		],
		['a clock', fact({ quantity: 'core-ratio', value: '52', stockValue: '47' })],
		[
			'the switch to a fixed clock',
			fact({ quantity: 'switch-current', unit: 'A', value: '78', stockValue: null })
		]
	])('not %s', (_, setting) => {
		expect(raiseOf(setting)).toBeNull();
	});

	it.each([
		['an offset up', 'voltage', volts('+0.05', 'Auto')],
		['a fixed voltage where stock is automatic', 'voltage', volts('1.25', 'Auto')],
		['a voltage that stock does not name', 'voltage', volts('1.25', null)],
		[
			'memory voltage',
			'voltage',
			fact({ quantity: 'memory-voltage', unit: 'V', value: '1.4', stockValue: '1.1' })
		],
		[
			'another load line',
			'voltage',
			fact({ quantity: 'load-line', value: 'Level 4', stockValue: 'Level 2' })
		],
		[
			'no power limit at all',
			'power',
			fact({ quantity: 'power-limit', unit: 'W', value: 'Unlimited', stockValue: '125' })
		],
		['a power limit', 'power', fact({ quantity: 'power-limit', unit: 'W', value: '253', stockValue: '125' })],
		[
			'a current limit in other units',
			'power',
			fact({ quantity: 'current-limit', unit: 'A', value: '400', stockValue: '307000 mA' })
		],
		[
			'a temperature limit',
			'heat',
			fact({ quantity: 'temperature-limit', unit: '°C', value: '100', stockValue: '95' })
		]
	])('%s is about %s', (_, topic, setting) => {
		expect(raiseOf(setting)).toMatchObject({ topic });
	});

	it('lists them in menu order', () => {
		const limit = fact({ quantity: 'power-limit', unit: 'W', value: '200', stockValue: '100' });
		expect(raises([limit, volts('1.1', '1.2'), volts('1.3', '1.2')]).map((raise) => raise.topic)).toEqual([
			'power',
			'voltage'
		]);
	});
});
