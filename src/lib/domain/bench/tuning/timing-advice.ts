import type { SettingQuantity } from '../words';
import { practice, type Advice } from './advice';
import { short } from './figures';
import { valuesOf, type GroupedSetting } from './setting-values';

interface Rule {
	of: SettingQuantity;
	parts: readonly [SettingQuantity, SettingQuantity];
	symbols: readonly [string, string, string];
	why: string;
	source: string;
}

const rules: readonly Rule[] = [
	{
		of: 'row-active',
		parts: ['row-to-column-delay', 'cas-latency'],
		symbols: ['tRAS', 'tRCD', 'CL'],
		why: 'A row is then closed before the first word is read from it, or the controller waits longer than was set.',
		source: practice
	},
	{
		of: 'row-cycle',
		parts: ['row-active', 'row-precharge'],
		symbols: ['tRC', 'tRAS', 'tRP'],
		why: 'A row cannot be opened again before it was active and precharged, so the controller may set another value.',
		source: 'public lists of DRAM timings give tRC as tRAS + tRP; the standard itself was not seen'
	}
];

/** Timings that are shorter than the sum of those that lie within them. Says nothing where one is not a number. */
export const timingAdvice = (settings: readonly GroupedSetting[]): Advice[] =>
	rules.flatMap(({ of, parts, symbols, why, source }): Advice[] => {
		const found = [of, ...parts].map((quantity) => valuesOf(settings, quantity));
		const [whole, first, second] = found.map(([value, ...more]) => (more.length > 0 ? undefined : value));
		if (!whole || !first || !second || whole.value >= first.value + second.value) return [];
		const [ofSymbol, a, b] = symbols;
		return [
			{
				kind: 'timings-out-of-order',
				severity: 'advice',
				words: `${ofSymbol} is ${short(whole.value)} and ${a} + ${b} are ${short(first.value + second.value)}. ${why}`,
				settings: [whole, first, second].map(({ fact }) => fact.setting),
				source
			}
		];
	});
