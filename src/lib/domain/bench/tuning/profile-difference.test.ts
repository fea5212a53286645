import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { profileDifference } from './profile-difference';
import { fact } from './setting-fact.fixture';

const clock = fact({ setting: 'Reference clock', quantity: 'reference-clock', unit: 'MHz', value: '100' });
const ratio = (value: string) => fact({ setting: 'Core ratio', quantity: 'core-ratio', value });
const volts = (value: string, unit: string) =>
	fact({ setting: 'Core voltage', quantity: 'core-voltage', unit, value });
const fans = fact({ menuPath: 'Cooling', setting: 'Fans', value: 'Full' });
const cache = fact({ setting: 'Cache', value: 'On' });

describe('the difference of two profiles', () => {
	const { settings, derived } = profileDifference(
		[clock, ratio('36'), volts('1.2', 'V'), fans],
		[{ ...clock, menuPath: 'Tuning>Clocks' }, cache, ratio('46'), volts('1200', 'mV')]
	);

	it('says what only one sets, what differs and what is the same', () => {
		expect(settings.map((one) => [one.setting, one.state])).toEqual([
			['Reference clock', 'same'],
			['Cache', 'only-b'],
			['Core ratio', 'differs'],
			['Core voltage', 'same'],
			['Fans', 'only-a']
		]);
	});

	it('puts what follows from both side by side', () => {
		// 100 MHz × 36 and × 46: public worked examples.
		expect(derived.map(({ name, a, b }) => [name, a?.value, b?.value])).toEqual([['Core clock', 3600, 4600]]);
		expect(derived[0]?.changePercent).toBeCloseTo((4600 / 3600 - 1) * 100, 9);
	});

	it('leaves a side empty where nothing follows', () => {
		const found = profileDifference([clock, ratio('Auto')], [clock, ratio('36')]).derived;
		expect(found).toMatchObject([{ a: null, b: { value: 3600 }, changePercent: null }]);
	});

	it('turns round with its sides', () => {
		const name = fc.constantFrom('one', 'two', 'three', 'four');
		const list = fc
			.uniqueArray(fc.tuple(name, fc.constantFrom('1', '2')), { selector: ([setting]) => setting })
			.map((rows) => rows.map(([setting, value]) => fact({ setting, value })));
		const turned = { 'only-a': 'only-b', 'only-b': 'only-a', differs: 'differs', same: 'same' };
		const states = (one: typeof settings, turn: boolean) =>
			one.map(({ setting, state }) => `${setting} ${turn ? turned[state] : state}`).sort();
		fc.assert(
			fc.property(list, list, (a, b) => {
				expect(states(profileDifference(a, b).settings, false)).toEqual(
					states(profileDifference(b, a).settings, true)
				);
				expect(profileDifference(a, a).settings.every(({ state }) => state === 'same')).toBe(true);
			})
		);
	});
});
