import type { SettingQuantity } from '../words';

export interface MeaningSuggestion {
	quantity: SettingQuantity;
	/** The part of the name it was guessed from. */
	from: string;
}

/**
 * Words of the trade and what they usually set (common practice, no source). The first that is found counts, so
 * those that say more stand first.
 */
const words: readonly [RegExp, SettingQuantity][] = [
	[/\bt?CL\b|\bCAS(?:#| latency)?(?!\w)/i, 'cas-latency'],
	[/\btRCD(?:RD|WR)?\b|\b(?:RAS|row) to (?:CAS|column)\b/i, 'row-to-column-delay'],
	[/\btRP\b|\brow precharge\b/i, 'row-precharge'],
	[/\btRAS\b|\brow active\b/i, 'row-active'],
	[/\btRC\b|\brow cycle\b/i, 'row-cycle'],
	[/\btRFC\d?\b|\brefresh cycle\b/i, 'refresh-cycle'],
	[/\bcommand rate\b/i, 'command-rate'],
	[/\bload[- ]?line\b|\bLLC\b/i, 'load-line'],
	[/\bSoC volt\w*|\bV ?SoC\b/i, 'soc-voltage'],
	[/\bVDDQ\b|\bmemory I\/?O volt\w*/i, 'memory-io-voltage'],
	[/\b(?:DRAM|memory|DIMM) volt\w*/i, 'memory-voltage'],
	[/\bV ?core\b|\b(?:core|CPU) volt\w*/i, 'core-voltage'],
	[/\bcontroller (?:clock|frequency)\b/i, 'memory-controller-clock'],
	[/\bfabric\b(?!.*volt)/i, 'fabric-clock'],
	[/\bdata rate\b|\b(?:memory|DRAM) (?:speed|frequency)\b/i, 'memory-data-rate'],
	[/\bswitch(?:ing)? current\b/i, 'switch-current'],
	[/\b(?:base|reference) clock\b|\bBCLK\b/i, 'reference-clock'],
	[/\bcurrent limit\b|\bICC ?max\b/i, 'current-limit'],
	[/\b(?:temperature|thermal) limit\b/i, 'temperature-limit'],
	[/\b(?:power limit|package power)\b/i, 'power-limit'],
	[/\bboost\b(?!.*(?:limit|clock|volt|current))/i, 'automatic-boost'],
	[/\b(?:ratio|multiplier)\b/i, 'core-ratio'],
	[/\b(?:core|CPU) (?:clock|frequency)\b/i, 'core-clock']
];

/**
 * What a setting's name suggests that it sets: a guess to be offered to the tester, never to be computed with
 * unasked. Null where no word of the trade is in it.
 * @example suggestMeaning('Vcore') // { quantity: 'core-voltage', from: 'Vcore' }
 */
export function suggestMeaning(name: string): MeaningSuggestion | null {
	for (const [pattern, quantity] of words) {
		const from = pattern.exec(name)?.[0];
		if (from !== undefined) return { quantity, from };
	}
	return null;
}
