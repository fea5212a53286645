import type { DerivedFact } from '../../articles/data';
import { menusOf, settingKey } from '../profile';
import { changePercent, clockMHz } from './clocks';
import { decimalsUpTo, short } from './figures';
import { asIn, ofGroup, valuesOf, type GroupedSetting, type SettingValue } from './setting-values';

export interface CoreClock {
	/** The setting it comes from, by its menus and name. */
	key: string;
	/** The setting's name, with its menu where another clock's setting has the same. */
	label: string;
	group: number | null;
	mhz: number;
	/** Null where the clock was set as such. */
	product: string | null;
}

function labelOf({ fact }: SettingValue, among: readonly SettingValue[]): string {
	const named = among.filter((other) => other.fact.setting === fact.setting).length;
	const menu = menusOf(fact.menuPath).at(-1);
	return named > 1 && menu ? `${fact.setting} (${menu})` : fact.setting;
}

/** The clock of each core ratio over its group's reference clock, and each core clock that is set as such. */
export function coreClocks(settings: readonly GroupedSetting[]): CoreClock[] {
	const ratios = valuesOf(settings, 'core-ratio');
	const set = valuesOf(settings, 'core-clock');
	const clock = (value: SettingValue, mhz: number, product: string | null): CoreClock => ({
		key: settingKey(value.fact),
		label: labelOf(value, [...ratios, ...set]),
		group: value.group,
		mhz,
		product
	});
	return [
		...ratios.flatMap((ratio) => {
			const reference = ofGroup(settings, 'reference-clock', ratio.group);
			if (reference === null) return [];
			const product = `${short(reference)} MHz × ${short(ratio.value)}`;
			return [clock(ratio, clockMHz(reference, ratio.value), product)];
		}),
		...set.map((value) => clock(value, value.value, null))
	];
}

function changeOf(clock: CoreClock, before: readonly CoreClock[], name: string, over: string): DerivedFact[] {
	const earlier = before.find((other) => other.key === clock.key);
	if (!earlier || earlier.mhz === clock.mhz) return [];
	return [
		{
			name: `${name} over ${over}`,
			value: changePercent(clock.mhz, earlier.mhz),
			unit: '%',
			decimals: 1,
			how: `(${short(clock.mhz)} MHz ÷ ${short(earlier.mhz)} MHz − 1) × 100`
		}
	];
}

/** Where cores have clocks of their own: the fastest, the slowest and how far they lie apart. */
function spreadOf(clocks: readonly CoreClock[]): DerivedFact[] {
	const [slowest, ...more] = [...clocks].sort((a, b) => a.mhz - b.mhz);
	const fastest = more.at(-1);
	if (!slowest || !fastest) return [];
	const inMHz = (name: string, value: number, how: string): DerivedFact => ({
		name,
		value,
		unit: 'MHz',
		decimals: decimalsUpTo(value, 1),
		how
	});
	const spread = inMHz(
		'Spread of core clocks',
		fastest.mhz - slowest.mhz,
		`Fastest − slowest: ${short(fastest.mhz)} MHz − ${short(slowest.mhz)} MHz`
	);
	return fastest.mhz === slowest.mhz
		? [spread]
		: [
				inMHz('Fastest core clock', fastest.mhz, `The highest of ${clocks.length}: ${fastest.label}`),
				inMHz('Slowest core clock', slowest.mhz, `The lowest of ${clocks.length}: ${slowest.label}`),
				spread
			];
}

/** Core clocks, each with its change over stock and parent, and their spread where there are several. */
export function coreFacts(settings: readonly GroupedSetting[]): DerivedFact[] {
	const now = coreClocks(settings);
	const stock = coreClocks(asIn(settings, 'stockValue'));
	const parent = coreClocks(asIn(settings, 'parentValue'));
	const parentIsStock = settings.every(
		(fact) => fact.parentValue === fact.stockValue || fact.parentValue === null
	);
	const each = now.flatMap((clock) => {
		const name = now.length === 1 ? 'Core clock' : `Core clock, ${clock.label}`;
		const product: DerivedFact[] = clock.product
			? [
					{
						name,
						value: clock.mhz,
						unit: 'MHz',
						decimals: decimalsUpTo(clock.mhz, 1),
						how: `Reference clock × ratio: ${clock.product}`
					}
				]
			: [];
		return [
			...product,
			...changeOf(clock, stock, name, 'stock'),
			...(parentIsStock ? [] : changeOf(clock, parent, name, 'the parent profile'))
		];
	});
	return [...each, ...spreadOf(now)];
}
