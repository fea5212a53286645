import { withUnit } from '$lib/domain/shared/quantity';

/** A setting's value with its unit, where the value does not carry one itself. */
export const valued = (value: string, unit: string): string =>
	/[a-z°×%]/i.test(value) ? value : withUnit(value, unit);
