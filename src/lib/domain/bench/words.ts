export const directions = ['higher', 'lower'] as const;
/** Which way a workload's quantity is better. */
export type Direction = (typeof directions)[number];

export const workloadClasses = ['light-threaded', 'all-core', 'game', 'memory', 'stress'] as const;
export type WorkloadClass = (typeof workloadClasses)[number];

export const headlines = ['mean', 'median'] as const;
/** Which average a workload's protocol puts in print. */
export type Headline = (typeof headlines)[number];

export const runSources = ['grid', 'csv', 'api'] as const;
export type RunSource = (typeof runSources)[number];

/** What a setting sets, where the application can compute with it; 'other' is printed as it stands. */
export const settingQuantities = [
	'reference-clock',
	'core-ratio',
	'core-clock',
	'core-voltage',
	'soc-voltage',
	'automatic-boost',
	'memory-data-rate',
	'memory-voltage',
	'memory-io-voltage',
	'cas-latency',
	'row-to-column-delay',
	'row-precharge',
	'row-active',
	'row-cycle',
	'refresh-cycle',
	'command-rate',
	'fabric-clock',
	'memory-controller-clock',
	'power-limit',
	'current-limit',
	'temperature-limit',
	'load-line',
	'switch-current',
	'other'
] as const;
export type SettingQuantity = (typeof settingQuantities)[number];
