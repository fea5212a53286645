import { isCurrency } from '../shared/money';
import { plainUnit, unitOf, type UnitKind } from '../shared/units';

export const costKinds = [
	'power',
	'energy',
	'temperature',
	'noise',
	'current',
	'voltage',
	'money',
	'value'
] as const;
/** What a strategy costs; `value` is what it brings for each watt, joule or unit of money. */
export type CostKind = (typeof costKinds)[number];

export const costWords: Record<CostKind, string> = {
	power: 'power',
	energy: 'energy',
	temperature: 'temperature',
	noise: 'noise',
	current: 'current',
	voltage: 'voltage',
	money: 'money',
	value: 'value'
};

const ofKind: Partial<Record<UnitKind, CostKind>> = {
	power: 'power',
	energy: 'energy',
	temperature: 'temperature',
	sound: 'noise',
	current: 'current',
	voltage: 'voltage'
};

/** Spellings that the table of units does not hold. */
const spelled: [RegExp, CostKind][] = [
	[/^(k|m|milli|kilo)?w(atts?)?$/i, 'power'],
	[/^((k|m|milli|kilo)?(j|joules?)|(k|m)?w[\s·]?h|watt[\s-]?hours?)$/i, 'energy'],
	[/^(°\s*[cfk]|℃|℉|k|kelvins?|celsius|fahrenheit|deg(ree)?s?\.?\s*[cf])$/i, 'temperature'],
	[/^(db\b.*|decibels?|sones?|phons?)$/i, 'noise'],
	[/^(k|m|milli)?(a|amps?|amperes?)$/i, 'current'],
	[/^(k|m|milli)?(v|volts?)$/i, 'voltage'],
	[/^([€$£¥₩₹]|euros?|dollars?|cents?)$/i, 'money']
];

function costOfOne(unit: string): CostKind | null {
	const kind = unitOf(unit)?.kind;
	if (kind) return ofKind[kind] ?? null;
	return spelled.find(([form]) => form.test(unit))?.[1] ?? (isCurrency(unit) ? 'money' : null);
}

/**
 * Whether a unit is of a cost (power, energy, temperature, noise, current, voltage, money) or of performance for a
 * cost, and of which; null for a score, a rate or a time, which are performance.
 * @example costOf('W') // 'power'
 * @example costOf('J/frame') // 'energy'
 * @example costOf('points/W') // 'value'
 */
export function costOf(unit: string): CostKind | null {
	const plain = plainUnit(unit);
	const whole = costOfOne(plain);
	if (whole || unitOf(plain)) return whole;
	const [top = '', ...below] = plain.split(/\s*\/\s*|\s+per\s+/i);
	return costOfOne(top) ?? (below.some((part) => costOfOne(part) !== null) ? 'value' : null);
}
