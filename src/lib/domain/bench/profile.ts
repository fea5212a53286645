import type { SettingFact } from '../articles/data';

/** A setting that a profile makes itself, in menu order within the profile. */
export type OwnSetting = Omit<SettingFact, 'parentValue' | 'stockValue'>;

interface Node {
	id: number;
	parentId: number | null;
}

/**
 * A profile's line of descent, stock first and the profile itself last.
 * RangeError where a parent is missing or the line never ends.
 */
export function chainTo<T extends Node>(profiles: readonly T[], id: number): T[] {
	const byId = new Map(profiles.map((profile) => [profile.id, profile]));
	const chain: T[] = [];
	for (let next: number | null = id; next !== null;) {
		const profile: T | undefined = byId.get(next);
		if (!profile || chain.includes(profile)) throw new RangeError('A profile must descend from stock.');
		chain.unshift(profile);
		next = profile.parentId;
	}
	return chain;
}

/** Menus from the outermost in. @example menusOf('Tuning > Clocks') // ['Tuning', 'Clocks'] */
export const menusOf = (menuPath: string): string[] =>
	menuPath
		.split('>')
		.map((menu) => menu.trim())
		.filter((menu) => menu !== '');

/** What a setting is known by: its menus and its name, whatever the spacing. */
export const settingKey = (setting: Pick<OwnSetting, 'menuPath' | 'setting'>): string =>
	JSON.stringify([menusOf(setting.menuPath), setting.setting.trim()]);

const sharedMenus = (a: OwnSetting, b: OwnSetting): number => {
	const [ours, theirs] = [menusOf(a.menuPath), menusOf(b.menuPath)];
	const parting = ours.findIndex((menu, depth) => menu !== theirs[depth]);
	return parting === -1 ? ours.length : parting;
};

/** A new setting goes behind the last of those that share most of its menus with it, so that a menu is opened once. */
function placeFor(setting: OwnSetting, among: readonly OwnSetting[]): number {
	let best = { at: among.length, shared: 0 };
	among.forEach((other, index) => {
		const shared = sharedMenus(setting, other);
		if (shared > 0 && shared >= best.shared) best = { at: index + 1, shared };
	});
	return best.at;
}

function merge(inherited: readonly OwnSetting[], own: readonly OwnSetting[]): OwnSetting[] {
	const merged = [...inherited];
	for (const setting of own) {
		const known = merged.findIndex((other) => settingKey(other) === settingKey(setting));
		if (known >= 0) merged[known] = setting;
		else merged.splice(placeFor(setting, merged), 0, setting);
	}
	return merged;
}

/** The other's value, with its unit where that is not the setting's own. */
function valueIn(settings: readonly OwnSetting[], setting: OwnSetting): string | null {
	const other = settings.find((candidate) => settingKey(candidate) === settingKey(setting));
	if (!other) return null;
	return other.unit === setting.unit ? other.value : `${other.value} ${other.unit}`.trim();
}

/**
 * All settings that hold under a profile, in menu order: stock's, then what each descendant changes or adds.
 * A setting is known by its menus and its name; a change keeps its place. Stock's own values are its stock values.
 * @param chain settings each profile makes itself, stock first, the profile itself last
 */
export function effectiveSettings(chain: readonly { settings: readonly OwnSetting[] }[]): SettingFact[] {
	const levels = chain.reduce<OwnSetting[][]>(
		(done, { settings }) => [...done, merge(done.at(-1) ?? [], settings)],
		[]
	);
	const stock = levels[0] ?? [];
	const parent = levels.at(-2) ?? [];
	return (levels.at(-1) ?? []).map((setting) => ({
		menuPath: setting.menuPath,
		setting: setting.setting,
		value: setting.value,
		unit: setting.unit,
		quantity: setting.quantity,
		note: setting.note,
		parentValue: valueIn(parent, setting),
		stockValue: valueIn(stock, setting)
	}));
}
