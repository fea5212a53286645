import type { SettingFact } from '../../articles/data';
import type { SettingQuantity } from '../words';
import { groupOf } from './group-of';
import { settingNumber } from './setting-number';

/** A setting, with its chiplet or core group where a mapping gave one; left out, its name and menus tell. */
export type GroupedSetting = SettingFact & { group?: number | null };

export interface SettingValue {
	fact: GroupedSetting;
	value: number;
	/** Chiplet or core group; null where it is for all. */
	group: number | null;
}

function absolute(fact: SettingFact): number | null {
	const number = settingNumber(fact.quantity, fact.value, fact.unit);
	return number && !number.offset && number.value > 0 ? number.value : null;
}

/** Every setting of a quantity that has a number above zero, in the quantity's own unit; offsets and words are none. */
export const valuesOf = (settings: readonly GroupedSetting[], quantity: SettingQuantity): SettingValue[] =>
	settings.flatMap((fact) => {
		const value = fact.quantity === quantity ? absolute(fact) : null;
		if (value === null) return [];
		return [{ fact, value, group: fact.group === undefined ? groupOf(fact) : fact.group }];
	});

const only = (values: readonly SettingValue[]): number | null =>
	values.length === 1 ? (values[0]?.value ?? null) : null;

/** The value of a quantity that is set once; null where it is not set, or set in several places. */
export const single = (settings: readonly GroupedSetting[], quantity: SettingQuantity): number | null =>
	only(valuesOf(settings, quantity));

/** The value that holds for a group: its own, else the one set for all. Null where neither is set once. */
export function ofGroup(
	settings: readonly GroupedSetting[],
	quantity: SettingQuantity,
	group: number | null
): number | null {
	const values = valuesOf(settings, quantity);
	if (group === null) return only(values);
	const own = values.filter((value) => value.group === group);
	return own.length > 0 ? only(own) : only(values.filter((value) => value.group === null));
}

/** The same settings as another profile has them, where it has them. */
export const asIn = (
	settings: readonly GroupedSetting[],
	key: 'parentValue' | 'stockValue'
): GroupedSetting[] =>
	settings.flatMap((fact) => (fact[key] === null ? [] : [{ ...fact, value: fact[key] }]));
