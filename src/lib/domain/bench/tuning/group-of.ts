import type { SettingFact } from '../../articles/data';
import { menusOf } from '../profile';

const numbered = /\b(?:chiplet|die|core\s*group|cluster|group)\s*#?\s*(\d{1,3})\b/i;

/**
 * Number of the chiplet or core group that a setting's name, or else the innermost of its menus, gives; null where
 * none does.
 * @example groupOf({ setting: 'Core group 2 ratio', menuPath: '' }) // 2
 */
export function groupOf({ setting, menuPath }: Pick<SettingFact, 'setting' | 'menuPath'>): number | null {
	for (const text of [setting, ...menusOf(menuPath).toReversed()]) {
		const number = numbered.exec(text)?.[1];
		if (number !== undefined) return Number(number);
	}
	return null;
}
