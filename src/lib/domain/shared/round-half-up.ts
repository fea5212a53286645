/**
 * Rounds a plain or scientific decimal text on its digits, halves away from zero (ISO 80000-1 Annex B, rule B), and
 * returns plain digits with an ASCII point and minus. Negative places round to tens, hundreds … No binary fraction is
 * ever made of it. RangeError for what is not a decimal number, or has more than a thousand places.
 * @example roundHalfUp('2.675', 2) === '2.68'; roundHalfUp('1.2345e3', -1) === '1230'
 */
export function roundHalfUp(decimal: string, places: number): string {
	const match = /^([+-]?)(\d+)(?:\.(\d*))?(?:e([+-]?\d{1,4}))?$/i.exec(decimal.trim());
	const [, sign = '', whole = '', fraction = '', exponent = '0'] = match ?? [];
	if (!match || !Number.isInteger(places)) throw new RangeError('Only a decimal number can be rounded.');
	const own = fraction.length - Number(exponent);
	if (Math.abs(own) > 1000 || Math.abs(places) > 1000)
		throw new RangeError('That number is too long to round.');
	const digits = BigInt(whole + fraction);
	const drop = own - places;
	const unit = 10n ** BigInt(Math.abs(drop));
	const kept = drop > 0 ? (digits + unit / 2n) / unit : digits * unit;
	const scaled = places < 0 ? kept * 10n ** BigInt(-places) : kept;
	const shown = Math.max(places, 0);
	const text = scaled.toString().padStart(shown + 1, '0');
	const cut = text.length - shown;
	return (
		(sign === '-' && scaled !== 0n ? '-' : '') + text.slice(0, cut) + (shown > 0 ? `.${text.slice(cut)}` : '')
	);
}
