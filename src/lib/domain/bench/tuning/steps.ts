import type { SettingFact } from '../../articles/data';
import { menusOf } from '../profile';
import { raiseOf, type Raise } from './raises';
import { asStock } from './setting-number';

interface MenuStep {
	kind: 'open-menu' | 'leave';
	/** From 1. */
	number: number;
	menu: string;
	/** The menu with those above it, from the outermost in. */
	path: string[];
}

interface SetStep {
	kind: 'set';
	number: number;
	setting: string;
	value: string;
	unit: string;
	note: string;
	stockValue: string | null;
	/** Whether it differs from stock. */
	changed: boolean;
	/** Present where it raises a voltage or a limit over stock; its topic names the caution. */
	caution: Raise | null;
}

export type Step = MenuStep | SetStep;

type Unnumbered = Omit<MenuStep, 'number'> | Omit<SetStep, 'number'>;

/** The way from one menu to another: out to where they part, then in. */
function way(from: readonly string[], to: readonly string[]): Unnumbered[] {
	const parting = from.findIndex((menu, depth) => menu !== to[depth]);
	const shared = parting === -1 ? from.length : parting;
	const menuStep = (kind: MenuStep['kind'], path: readonly string[], depth: number): Unnumbered => ({
		kind,
		menu: path[depth] ?? '',
		path: path.slice(0, depth + 1)
	});
	return [
		...from.slice(shared).map((_, index) => menuStep('leave', from, from.length - 1 - index)),
		...to.slice(shared).map((_, index) => menuStep('open-menu', to, shared + index))
	];
}

/**
 * A profile as numbered steps in menu order: each menu opened and left, each setting set, so that a reader at
 * another machine arrives at the same profile. Settings that stock has already are among them, marked unchanged.
 */
export function steps(settings: readonly SettingFact[]): Step[] {
	const found: Unnumbered[] = [];
	let place: string[] = [];
	for (const fact of settings) {
		const menus = menusOf(fact.menuPath);
		found.push(...way(place, menus), {
			kind: 'set',
			setting: fact.setting,
			value: fact.value,
			unit: fact.unit,
			note: fact.note,
			stockValue: fact.stockValue,
			changed: !asStock(fact),
			caution: raiseOf(fact)
		});
		place = menus;
	}
	found.push(...way(place, []));
	return found.map((step, index) => ({ ...step, number: index + 1 }));
}
