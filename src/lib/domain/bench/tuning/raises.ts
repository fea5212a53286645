import type { SettingFact } from '../../articles/data';
import type { SettingQuantity } from '../words';
import { changePercent } from './clocks';
import { asStock, settingNumber } from './setting-number';

/** The caution that a raised setting calls for. */
export type RaiseTopic = 'voltage' | 'power' | 'heat';

const topics: Partial<Record<SettingQuantity, RaiseTopic>> = {
	'core-voltage': 'voltage',
	'soc-voltage': 'voltage',
	'memory-voltage': 'voltage',
	'memory-io-voltage': 'voltage',
	'load-line': 'voltage',
	'power-limit': 'power',
	'current-limit': 'power',
	'temperature-limit': 'heat'
};

export interface Raise {
	topic: RaiseTopic;
	menuPath: string;
	setting: string;
	quantity: SettingQuantity;
	/** Values with their units; null where stock leaves the setting alone. */
	from: string | null;
	to: string;
	/** Over stock, in percent; null where it cannot be told, as for words, offsets and temperatures. */
	byPercent: number | null;
}

const leftToTheMaker = /^(auto|automatic|default|stock|normal|standard)\b/i;

const withUnit = (value: string, unit: string): string =>
	unit === '' || /[a-z°×%]/i.test(value) ? value : `${value} ${unit}`;

/** How far a setting goes over stock, in percent; null where it does not; 'unknown' where that cannot be told. */
function overStock(fact: SettingFact): number | 'unknown' | null {
	if (asStock(fact) || leftToTheMaker.test(fact.value)) return null;
	const now = settingNumber(fact.quantity, fact.value, fact.unit);
	const stock = fact.stockValue === null ? null : settingNumber(fact.quantity, fact.stockValue, fact.unit);
	if (now?.offset) return now.value > (stock?.offset ? stock.value : 0) ? 'unknown' : null;
	// A limit or voltage that stock does not give, or that is a word, may well be above it.
	if (!now || !stock || stock.offset) return 'unknown';
	if (now.value <= stock.value) return null;
	return fact.quantity === 'temperature-limit' || stock.value <= 0
		? 'unknown'
		: changePercent(now.value, stock.value);
}

/**
 * Whether a setting raises a voltage or a limit of power, current or temperature over stock; null where it does not.
 * Where that cannot be told (stock does not say, a word instead of a number, another load line) it counts as raised,
 * for a caution too many costs a line and a caution too few costs hardware.
 */
export function raiseOf(fact: SettingFact): Raise | null {
	const topic = topics[fact.quantity];
	const over = topic ? overStock(fact) : null;
	if (!topic || over === null) return null;
	return {
		topic,
		menuPath: fact.menuPath,
		setting: fact.setting,
		quantity: fact.quantity,
		from: fact.stockValue === null ? null : withUnit(fact.stockValue, fact.unit),
		to: withUnit(fact.value, fact.unit),
		byPercent: over === 'unknown' ? null : over
	};
}

/** Every raise of a profile, in menu order; preflight asks for a caution on each topic among them. */
export const raises = (settings: readonly SettingFact[]): Raise[] =>
	settings.flatMap((fact) => raiseOf(fact) ?? []);
