import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { currencyDigits, decimalAmount, formatMoney, isCurrency, minorUnits } from './money';

describe('currencyDigits', () => {
	// ISO 4217 minor units, as several public programs' tables of the standard list them.
	it.each([
		['USD', 2],
		['EUR', 2],
		['JPY', 0],
		['GBP', 2],
		['KWD', 3],
		['BHD', 3],
		['CHF', 2],
		['KRW', 0]
	])('%s has %i', (currency, digits) => expect(currencyDigits(currency)).toBe(digits));
});

describe('minorUnits', () => {
	it.each([
		['689', 'USD', 68900],
		['689.9', 'USD', 68990],
		['689,90', 'EUR', 68990],
		['1 249.50', 'USD', 124950],
		['0.07', 'USD', 7],
		// 1.005 × 100 is 100.49999999999999 in binary; here the digits are moved, not multiplied.
		['1.005', 'KWD', 1005],
		['12.00', 'JPY', 12]
	])('%s %s is %i', (typed, currency, amountMinor) =>
		expect(minorUnits(typed, currency)).toEqual({ ok: true, amountMinor })
	);

	it.each([
		['-5', 'USD'],
		['', 'USD'],
		['abc', 'USD'],
		['1e3', 'USD'],
		['1.2.3', 'USD'],
		['1,234.50', 'USD'],
		['0.001', 'USD'],
		['1.5', 'JPY'],
		['99999999999999999', 'USD']
	])('refuses %s %s', (typed, currency) => expect(minorUnits(typed, currency).ok).toBe(false));

	it('comes back the same through its decimal text', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 0, max: 9e14 }),
				fc.constantFrom('USD', 'JPY', 'KWD'),
				(amountMinor, currency) => {
					expect(minorUnits(decimalAmount(amountMinor, currency), currency)).toEqual({
						ok: true,
						amountMinor
					});
				}
			)
		);
	});
});

describe('isCurrency', () => {
	it('knows ISO 4217 and nothing else', () => {
		expect(['USD', 'EUR', 'JPY'].every(isCurrency)).toBe(true);
		expect(['usd', 'ABCD', 'XYZ', ''].some(isCurrency)).toBe(false);
	});
});

describe('formatMoney', () => {
	it('prints with the currency’s digits', () => {
		expect(formatMoney(68900, 'USD')).toBe('$689.00');
		expect(formatMoney(12000, 'JPY')).toBe('¥12,000');
		expect(formatMoney(900719925474099, 'USD')).toBe('$9,007,199,254,740.99');
	});
});
