/** The value itself, where it is a finite number above zero; RangeError naming it where not. */
export function positive(value: number, what: string): number {
	if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`The ${what} must be above zero.`);
	return value;
}
