import type { SettingFact } from '../../articles/data';
import { parseReading } from '../numbers';
import type { SettingQuantity } from '../words';

const clocks = { mhz: 1, ghz: 1000, khz: 0.001 };
const volts = { v: 1, mv: 0.001 };
const timings = { '': 1, t: 1, clk: 1, clocks: 1 };
const ratios = { '': 1, x: 1, '×': 1 };

/** Units of each quantity and what one of them is in the quantity's own: MHz, MT/s, V, W, A, °C, clocks. */
const units: Partial<Record<SettingQuantity, Record<string, number>>> = {
	'reference-clock': clocks,
	'core-ratio': ratios,
	'core-clock': clocks,
	'core-voltage': volts,
	'soc-voltage': volts,
	'memory-data-rate': { 'mt/s': 1, 'gt/s': 1000 },
	'memory-voltage': volts,
	'memory-io-voltage': volts,
	'cas-latency': timings,
	'row-to-column-delay': timings,
	'row-precharge': timings,
	'row-active': timings,
	'row-cycle': timings,
	'refresh-cycle': timings,
	'command-rate': { '': 1, t: 1, n: 1 },
	'fabric-clock': clocks,
	'memory-controller-clock': clocks,
	'power-limit': { w: 1, kw: 1000, mw: 0.001 },
	'current-limit': { a: 1, ma: 0.001 },
	'temperature-limit': { '°c': 1, c: 1 },
	'switch-current': { a: 1, ma: 0.001 }
};

export interface SettingNumber {
	/** In MHz, MT/s, V, W, A, °C or clocks, as the quantity has it. */
	value: number;
	/** Written with a sign: added to what the maker sets, not instead of it. */
	offset: boolean;
}

/**
 * A setting's value as a number, its unit beside it or behind it; null where it is a word (Auto, Level 3),
 * or where its unit is missing or not one of the quantity's.
 * @example settingNumber('core-voltage', '1240', 'mV') // { value: 1.24, offset: false }
 */
export function settingNumber(quantity: SettingQuantity, value: string, unit: string): SettingNumber | null {
	const match = /^(?:cl|x|×)?\s*([+\-−]?)\s*(\d[\d.,\s]*?)\s*([^\d\s.,+-].*)?$/i.exec(value.trim());
	if (!match) return null;
	const [, sign = '', digits = '', behind] = match;
	const factor = units[quantity]?.[(behind ?? unit).trim().toLowerCase()];
	const parsed = parseReading(digits);
	if (factor === undefined || !parsed.ok) return null;
	return { value: (sign === '' || sign === '+' ? 1 : -1) * parsed.value * factor, offset: sign !== '' };
}

/** Whether a quantity is one that is written as a number with a unit. */
export const hasUnits = (quantity: SettingQuantity): boolean => quantity in units;

/** Whether a setting is as stock has it, by its number where it has one, else by its words. */
export function asStock({ quantity, value, stockValue, unit }: SettingFact): boolean {
	if (stockValue === null || value === stockValue) return value === stockValue;
	const now = settingNumber(quantity, value, unit);
	const stock = settingNumber(quantity, stockValue, unit);
	return now !== null && stock !== null && now.value === stock.value && now.offset === stock.offset;
}
