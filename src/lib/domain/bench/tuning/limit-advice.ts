import type { PartKind } from '../../stores/words';
import type { SettingFact } from '../../articles/data';
import type { SettingQuantity } from '../words';
import type { Advice } from './advice';
import { short } from './figures';
import { settingNumber } from './setting-number';

/** A row of the lab's own limits table. */
export interface LabLimit {
	quantity: SettingQuantity;
	/** Holds for rigs with a part of this kind; 'other', for every rig. */
	partKind: PartKind;
	limit: number;
	unit: string;
	/** Why this much, in words. */
	source: string;
}

const makersLimit = 'The maker’s limit for your part stands above ours.';
const leftAlone = /^(auto|automatic|default|stock|normal|standard)\b/i;

const written = (value: string, unit: string): string =>
	unit === '' || /[a-z°×%]/i.test(value) ? value : `${value} ${unit}`;

interface Bound {
	row: LabLimit;
	value: number;
}

/** The lowest limit of a quantity that applies; rows whose unit is not one of the quantity's are passed over. */
function boundOf(quantity: SettingQuantity, limits: readonly LabLimit[]): Bound | null {
	const bounds = limits.flatMap((row): Bound[] => {
		const number = row.quantity === quantity ? settingNumber(quantity, String(row.limit), row.unit) : null;
		return number ? [{ row, value: number.value }] : [];
	});
	return bounds.sort((a, b) => a.value - b.value)[0] ?? null;
}

function adviceOf(fact: SettingFact, { row, value }: Bound): Advice | null {
	if (leftAlone.test(fact.value.trim())) return null;
	const limit = `the lab’s own limit of ${short(row.limit)} ${row.unit}`.trim();
	const about = {
		settings: [fact.setting],
		source: `the lab’s limits table: ${row.source.replace(/\.$/, '')}`
	};
	const number = settingNumber(fact.quantity, fact.value, fact.unit);
	const set = `${fact.setting} is set to ${written(fact.value, fact.unit)}`;
	if (!number || number.offset) {
		return {
			...about,
			kind: 'limit-not-told',
			severity: 'advice',
			words: `${set}, which cannot be held against ${limit}. ${makersLimit}`
		};
	}
	// Units are converted in binary, so what is equal in print must not count as more.
	if (number.value <= value * (1 + 1e-9)) return null;
	return {
		...about,
		kind: 'over-the-lab-limit',
		severity: 'warning',
		words: `${set}, over ${limit}. ${makersLimit}`
	};
}

/**
 * Settings over the lab's own limits, and those that cannot be held against them because they are an offset or a word.
 * Of several limits that apply to a quantity, the lowest counts.
 * @param kinds kinds of the parts in the rig; left out, limits of every kind apply
 */
export function limitAdvice(
	settings: readonly SettingFact[],
	limits: readonly LabLimit[],
	kinds?: readonly PartKind[]
): Advice[] {
	const applying = limits.filter(
		({ partKind }) => kinds === undefined || partKind === 'other' || kinds.includes(partKind)
	);
	return settings.flatMap((fact) => {
		const bound = boundOf(fact.quantity, applying);
		return (bound && adviceOf(fact, bound)) ?? [];
	});
}
