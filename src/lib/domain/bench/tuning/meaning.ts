import type { SettingFact } from '../../articles/data';
import { menusOf } from '../profile';
import type { SettingQuantity } from '../words';
import { groupOf } from './group-of';

/** What one family of firmware calls a setting, and what that sets; testers keep the list. */
export interface MeaningEntry {
	/** The firmware family, as the lab calls it. */
	family: string;
	/** Only under these menus, where another menu uses the name for something else; left out, under any. */
	menuPath?: string;
	/** The setting's name; a lone number in a row's name, as in “Core group 2 ratio”, may be missing here. */
	setting: string;
	quantity: SettingQuantity;
	/** Chiplet or core group, where this very name stands for one; 0 or left out, for all. */
	coreGroup?: number;
}

export interface Meaning {
	quantity: SettingQuantity;
	/** Number of the chiplet or core group; null where the setting is for all, or does not say. */
	group: number | null;
	/** Who says so: the row itself, the family's mapping, or nobody. */
	known: 'row' | 'mapping' | 'unknown';
}

type Row = Pick<SettingFact, 'menuPath' | 'setting' | 'quantity'>;

/** A setting whose quantity is told by the mapping where the row does not say. */
export type MeantSetting = SettingFact & Pick<Meaning, 'group' | 'known'>;

const plain = (text: string): string => text.toLowerCase().replace(/\s+/g, '');
const plainPath = (path: string): string => menusOf(path).map(plain).join('>');
const loneNumber = /(?<![\w.])#?(\d{1,3})(?![\w.])/;

/** The entry for a row: by its whole name before its name without a number, with menus before without. */
function entryFor(row: Row, family: string, entries: readonly MeaningEntry[]) {
	const known = entries
		.filter((entry) => plain(entry.family) === plain(family))
		.filter((entry) => !entry.menuPath || plainPath(entry.menuPath) === plainPath(row.menuPath))
		.sort((a, b) => Number(Boolean(b.menuPath)) - Number(Boolean(a.menuPath)));
	const named = (name: string) => known.find((entry) => plain(entry.setting) === plain(name));
	const whole = named(row.setting);
	if (whole) return { entry: whole, number: null };
	const number = loneNumber.exec(row.setting)?.[1];
	const entry = number === undefined ? undefined : named(row.setting.replace(loneNumber, ''));
	return entry ? { entry, number: Number(number) } : null;
}

/**
 * What a setting sets, whatever its firmware calls it: what the row says itself, else what the mapping of the
 * firmware's family says. Names are compared without regard to case and spaces.
 * @param entries of any families; those of others are passed over
 */
export function meaningOf(row: Row, family: string, entries: readonly MeaningEntry[]): Meaning {
	const found = entryFor(row, family, entries);
	const group = (found?.entry.coreGroup || found?.number) ?? groupOf(row);
	if (row.quantity !== 'other') return { quantity: row.quantity, group, known: 'row' };
	return found
		? { quantity: found.entry.quantity, group, known: 'mapping' }
		: { quantity: 'other', group, known: 'unknown' };
}

/** Settings with their meanings put in, for the functions that compute with them. */
export const meant = (
	settings: readonly SettingFact[],
	family: string,
	entries: readonly MeaningEntry[]
): MeantSetting[] => settings.map((fact) => ({ ...fact, ...meaningOf(fact, family, entries) }));
