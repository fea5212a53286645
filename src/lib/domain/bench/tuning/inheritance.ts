import { effectiveSettings, settingKey, type OwnSetting } from '../profile';
import type { SettingFact } from '../../articles/data';
import { asStock } from './setting-number';

/** A profile of a line of descent, with what it sets itself. */
export interface Ancestor {
	slug: string;
	name: string;
	settings: readonly OwnSetting[];
}

type By = Pick<Ancestor, 'slug' | 'name'>;

export interface Inheritance {
	/** What it sets to another value than its parent has, and who had set it last. */
	changes: { fact: SettingFact; from: string; setBy: By }[];
	/** What it sets that none above it sets. */
	adds: { fact: SettingFact }[];
	/** What it sets again as its parent has it. */
	repeats: { fact: SettingFact; setBy: By }[];
	/** What it does not set itself, and from whom it takes each. */
	takesOver: { fact: SettingFact; setBy: By }[];
}

/** The last above the profile that sets a setting itself. */
const lastToSet = (above: readonly Ancestor[], fact: SettingFact): By | null => {
	const found = above.findLast(({ settings }) =>
		settings.some((own) => settingKey(own) === settingKey(fact))
	);
	return found ? { slug: found.slug, name: found.name } : null;
};

/**
 * What a profile changes, adds, sets again and takes over, each list in menu order. Stock adds all that it sets.
 * @param line from stock down to the profile itself
 */
export function inheritance(line: readonly Ancestor[]): Inheritance {
	const result: Inheritance = { changes: [], adds: [], repeats: [], takesOver: [] };
	const own = new Set(line.at(-1)?.settings.map(settingKey));
	const above = line.slice(0, -1);
	for (const fact of effectiveSettings(line)) {
		const setBy = lastToSet(above, fact);
		const isOwn = own.has(settingKey(fact));
		if (!setBy || fact.parentValue === null) result.adds.push({ fact });
		else if (!isOwn) result.takesOver.push({ fact, setBy });
		else if (asStock({ ...fact, stockValue: fact.parentValue })) result.repeats.push({ fact, setBy });
		else result.changes.push({ fact, from: fact.parentValue, setBy });
	}
	return result;
}
