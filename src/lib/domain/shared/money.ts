/** ISO 4217 codes that this platform knows, in alphabetical order. */
export const currencies: readonly string[] = Intl.supportedValuesOf('currency');

const known = new Set(currencies);

/** Whether a text is an ISO 4217 code, in capitals. */
export const isCurrency = (code: string): boolean => known.has(code);

/** Decimals of a currency's amounts: 2 for USD, 0 for JPY, 3 for KWD (ISO 4217, as Intl carries it). */
export const currencyDigits = (currency: string): number =>
	new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ?? 2;

const figures = /^(\d{1,3}(?:[\s'’]\d{3})+|\d+)(?:[.,](\d+))?$/;
export const amountWanted = 'Write the amount in figures, such as 1249.50.';

/** Whether a text is an amount in figures, whatever its currency. */
export const isAmount = (typed: string): boolean => figures.test(typed.trim());

export type Amount = { ok: true; amountMinor: number } | { ok: false; message: string };

/**
 * An amount as typed, in minor units of its currency: exact, digit by digit, never through a binary fraction.
 * Takes a decimal point or comma and spaces between thousands; refuses signs, more decimals than the currency has, and
 * what no integer holds exactly.
 * @example minorUnits('689.9', 'USD') // { ok: true, amountMinor: 68990 }
 */
export function minorUnits(typed: string, currency: string): Amount {
	const match = figures.exec(typed.trim());
	if (!match) return { ok: false, message: amountWanted };
	const digits = currencyDigits(currency);
	const fraction = match[2] ?? '';
	if (fraction.length > digits && /[1-9]/.test(fraction.slice(digits))) {
		const places = digits === 0 ? 'no decimals' : digits === 1 ? '1 decimal' : `${digits} decimals`;
		return { ok: false, message: `${currency} has ${places}.` };
	}
	const whole = (match[1] ?? '').replace(/\D/g, '');
	const amountMinor = Number(whole + fraction.slice(0, digits).padEnd(digits, '0'));
	if (!Number.isSafeInteger(amountMinor)) return { ok: false, message: 'This amount is too large to keep.' };
	return { ok: true, amountMinor };
}

/** Minor units as a plain decimal text, for a field or the API. @example decimalAmount(68990, 'USD') // '689.90' */
export function decimalAmount(amountMinor: number, currency: string): string {
	const digits = currencyDigits(currency);
	const text = String(amountMinor).padStart(digits + 1, '0');
	return digits === 0 ? text : `${text.slice(0, -digits)}.${text.slice(-digits)}`;
}

/** An amount for people. @example formatMoney(68900, 'USD') // '$689.00' */
export const formatMoney = (amountMinor: number, currency: string): string =>
	new Intl.NumberFormat('en', { style: 'currency', currency, currencyDisplay: 'narrowSymbol' }).format(
		// Number.prototype does not divide exactly; the formatter takes the decimal text as it stands.
		decimalAmount(amountMinor, currency) as Intl.StringNumericLiteral
	);
