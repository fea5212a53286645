import type { SettingFact } from './data';
import type { CautionTopic } from './directives/shape';
import type { SettingQuantity } from '../bench/words';

/** Settings that cost hardware when raised, with the caution each calls for. */
const risky: Partial<Record<SettingQuantity, CautionTopic>> = {
	'core-voltage': 'voltage',
	'memory-voltage': 'voltage',
	'power-limit': 'power',
	'current-limit': 'power',
	'temperature-limit': 'heat'
};

/** A setting's number; null for a word such as Auto. A decimal comma counts as a point. */
function numberOf(value: string): number | null {
	const number = Number(value.trim().replace(',', '.'));
	return value.trim() === '' || !Number.isFinite(number) ? null : number;
}

/** How far a setting stands over stock, in percent; null where either is no number above zero. */
export function percentOverStock(fact: Pick<SettingFact, 'value' | 'stockValue'>): number | null {
	const ours = numberOf(fact.value);
	const theirs = fact.stockValue === null ? null : numberOf(fact.stockValue);
	return ours === null || theirs === null || theirs <= 0 ? null : (ours / theirs - 1) * 100;
}

/**
 * The caution a setting calls for: it raises a voltage or a limit over stock, or fixes one by hand that stock
 * leaves to the board. Null where it lowers it or is of another kind.
 */
export function riskOf(fact: SettingFact): CautionTopic | null {
	const topic = risky[fact.quantity];
	if (!topic) return null;
	const number = numberOf(fact.value);
	// A word such as Auto or Enabled sets no number of ours.
	if (number === null) return null;
	const over = percentOverStock(fact);
	return over === null || over > 0 ? topic : null;
}
