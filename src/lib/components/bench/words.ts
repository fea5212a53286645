import type { Direction, Headline, SettingQuantity, WorkloadClass } from '$lib/domain/bench/words';

const optionsOf = <K extends string>(words: Record<K, string>) =>
	(Object.entries(words) as [K, string][]).map(([value, label]) => ({ value, label }));

export const classWords: Record<WorkloadClass, string> = {
	'light-threaded': 'light-threaded',
	'all-core': 'all-core',
	game: 'game',
	memory: 'memory',
	stress: 'stress'
};

export const betterWords: Record<Direction, string> = { higher: 'more is better', lower: 'less is better' };

const headlineWords: Record<Headline, string> = { mean: 'mean', median: 'median' };

/** What a setting sets, in the words of the table of settings. */
export const quantityWords: Record<SettingQuantity, string> = {
	'reference-clock': 'reference clock',
	'core-ratio': 'core ratio',
	'core-clock': 'core clock',
	'core-voltage': 'core voltage',
	'soc-voltage': 'system-on-chip voltage',
	'automatic-boost': 'automatic boost',
	'memory-data-rate': 'memory data rate',
	'memory-voltage': 'memory voltage',
	'memory-io-voltage': 'memory input and output voltage',
	'cas-latency': 'CAS latency',
	'row-to-column-delay': 'row to column delay (tRCD)',
	'row-precharge': 'row precharge (tRP)',
	'row-active': 'row active time (tRAS)',
	'row-cycle': 'row cycle time (tRC)',
	'refresh-cycle': 'refresh cycle time (tRFC)',
	'command-rate': 'command rate',
	'fabric-clock': 'fabric clock',
	'memory-controller-clock': 'memory controller clock',
	'power-limit': 'power limit',
	'current-limit': 'current limit',
	'temperature-limit': 'temperature limit',
	'load-line': 'load line',
	'switch-current': 'switch current',
	other: 'other'
};

export const classOptions = optionsOf(classWords);
export const betterOptions = optionsOf(betterWords);
export const headlineOptions = optionsOf(headlineWords);
export const quantityOptions = optionsOf(quantityWords);
