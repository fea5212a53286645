import type { DerivedFact, SettingFact } from '../../articles/data';
import { settingKey } from '../profile';
import { changePercent } from './clocks';
import { derivedFacts } from './derive';
import { asStock } from './setting-number';
import type { GroupedSetting } from './setting-values';

export type DifferenceState = 'only-a' | 'only-b' | 'differs' | 'same';

export interface SettingDifference {
	state: DifferenceState;
	menuPath: string;
	setting: string;
	/** Null where the profile leaves the setting alone. */
	a: SettingFact | null;
	b: SettingFact | null;
}

export interface DerivedDifference {
	name: string;
	/** Null where it does not follow from the profile. */
	a: DerivedFact | null;
	b: DerivedFact | null;
	/** B over A, in percent; null where one is missing, is not above zero, or is a percentage itself. */
	changePercent: number | null;
}

export interface ProfileDifference {
	/** In menu order: A's, with what only B sets behind what B sets before it. */
	settings: SettingDifference[];
	/** What follows from each, side by side; what compares with a parent or with stock is each profile's own matter. */
	derived: DerivedDifference[];
}

/** Items of both lists by key: A's order, each that only B has behind the one before it in B. */
function sideBySide<T>(a: readonly T[], b: readonly T[], keyOf: (item: T) => string) {
	const merged = a.map((item) => ({ key: keyOf(item), a: item as T | null, b: null as T | null }));
	let place = 0;
	for (const item of b) {
		const key = keyOf(item);
		const at = merged.findIndex((one) => one.key === key);
		const known = merged[at];
		if (known) known.b = item;
		else merged.splice(place, 0, { key, a: null, b: item });
		place = (known ? at : place) + 1;
	}
	return merged;
}

function stateOf(a: SettingFact | null, b: SettingFact | null): DifferenceState {
	if (!a || !b) return a ? 'only-a' : 'only-b';
	const theirs = b.unit === a.unit ? b.value : `${b.value} ${b.unit}`.trim();
	return asStock({ ...a, stockValue: theirs }) ? 'same' : 'differs';
}

function settingsOf(a: readonly SettingFact[], b: readonly SettingFact[]): SettingDifference[] {
	return sideBySide(a, b, settingKey).flatMap((pair) => {
		const named = pair.a ?? pair.b;
		return named
			? [
					{
						state: stateOf(pair.a, pair.b),
						menuPath: named.menuPath,
						setting: named.setting,
						a: pair.a,
						b: pair.b
					}
				]
			: [];
	});
}

const changeOf = (a: DerivedFact | null, b: DerivedFact | null): number | null =>
	a && b && a.unit !== '%' && a.value > 0 ? changePercent(b.value, a.value) : null;

/**
 * The difference of any two profiles: each setting that holds under either, and what follows from both side by side.
 * Values are compared by their numbers where they have one, so that 1.2 V and 1200 mV are the same.
 * @param a settings that hold under each profile (`effectiveSettings`), with meanings put in where there is a mapping
 */
export function profileDifference(
	a: readonly GroupedSetting[],
	b: readonly GroupedSetting[]
): ProfileDifference {
	const own = (settings: readonly GroupedSetting[]) =>
		derivedFacts(settings.map((fact) => ({ ...fact, parentValue: null })));
	return {
		settings: settingsOf(a, b),
		derived: sideBySide(own(a), own(b), (fact) => fact.name).map((pair) => ({
			name: (pair.a ?? pair.b)?.name ?? '',
			a: pair.a,
			b: pair.b,
			changePercent: changeOf(pair.a, pair.b)
		}))
	};
}
