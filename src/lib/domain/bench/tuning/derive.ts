import type { DerivedFact, SettingFact } from '../../articles/data';
import type { SettingQuantity } from '../words';
import { changePercent, clockMHz } from './clocks';
import { clockPeriodNs, memoryClockMHz, peakBandwidthMBs, synchronous, wordLatencyNs } from './memory';
import { dynamicPowerFactor } from './power';
import { settingNumber } from './setting-number';

interface Clock {
	/** Of the setting, for a profile with several. */
	setting: string;
	mhz: number;
	/** Null where the clock was set as such. */
	product: string | null;
}

const short = (value: number): string => String(Number(value.toPrecision(8)));

function absolute(fact: SettingFact): number | null {
	const number = settingNumber(fact.quantity, fact.value, fact.unit);
	return number && !number.offset && number.value > 0 ? number.value : null;
}

const valuesOf = (settings: readonly SettingFact[], quantity: SettingQuantity) =>
	settings.flatMap((fact) => {
		const value = fact.quantity === quantity ? absolute(fact) : null;
		return value === null ? [] : [{ setting: fact.setting, value }];
	});

/** The value of a quantity that is set once; null where it is not set, or set in several places. */
function single(settings: readonly SettingFact[], quantity: SettingQuantity): number | null {
	const [only, ...more] = valuesOf(settings, quantity);
	return only && more.length === 0 ? only.value : null;
}

/** The same settings as another profile has them, where it has them. */
const asIn = (settings: readonly SettingFact[], key: 'parentValue' | 'stockValue'): SettingFact[] =>
	settings.flatMap((fact) => (fact[key] === null ? [] : [{ ...fact, value: fact[key] }]));

function clocksOf(settings: readonly SettingFact[]): Clock[] {
	const reference = single(settings, 'reference-clock');
	const products = valuesOf(settings, 'core-ratio').flatMap(({ setting, value }) =>
		reference === null
			? []
			: [{ setting, mhz: clockMHz(reference, value), product: `${short(reference)} MHz × ${short(value)}` }]
	);
	const set = valuesOf(settings, 'core-clock').map(({ setting, value }) => ({
		setting,
		mhz: value,
		product: null
	}));
	return [...products, ...set];
}

function changeOf(clock: Clock, before: readonly Clock[], name: string, over: string): DerivedFact[] {
	const earlier = before.find((other) => other.setting === clock.setting);
	if (!earlier || earlier.mhz === clock.mhz) return [];
	return [
		{
			name: `${name} over ${over}`,
			value: changePercent(clock.mhz, earlier.mhz),
			unit: '%',
			how: `(${short(clock.mhz)} MHz ÷ ${short(earlier.mhz)} MHz − 1) × 100`
		}
	];
}

function coreFacts(settings: readonly SettingFact[]): DerivedFact[] {
	const now = clocksOf(settings);
	const stock = clocksOf(asIn(settings, 'stockValue'));
	const parent = clocksOf(asIn(settings, 'parentValue'));
	const parentIsStock = settings.every(
		(fact) => fact.parentValue === fact.stockValue || fact.parentValue === null
	);
	return now.flatMap((clock) => {
		const name = now.length === 1 ? 'Core clock' : `Core clock, ${clock.setting}`;
		const product = clock.product
			? [{ name, value: clock.mhz, unit: 'MHz', how: `Reference clock × ratio: ${clock.product}` }]
			: [];
		return [
			...product,
			...changeOf(clock, stock, name, 'stock'),
			...(parentIsStock ? [] : changeOf(clock, parent, name, 'the parent profile'))
		];
	});
}

function memoryFacts(settings: readonly SettingFact[]): DerivedFact[] {
	const rate = single(settings, 'memory-data-rate');
	if (rate === null) return [];
	const cas = single(settings, 'cas-latency');
	const latency =
		cas === null
			? []
			: [
					{
						name: 'First-word latency',
						value: wordLatencyNs(rate, cas),
						unit: 'ns',
						how: `2000 × CAS latency ÷ data rate: 2000 × ${short(cas)} ÷ ${short(rate)} MT/s`
					}
				];
	return [
		{
			name: 'Memory clock',
			value: memoryClockMHz(rate),
			unit: 'MHz',
			how: `Data rate ÷ 2: ${short(rate)} MT/s ÷ 2`
		},
		{
			name: 'Memory clock period',
			value: clockPeriodNs(rate),
			unit: 'ns',
			how: `2000 ÷ data rate: 2000 ÷ ${short(rate)} MT/s`
		},
		...latency,
		{
			name: 'Peak bandwidth of a module',
			value: peakBandwidthMBs(rate),
			unit: 'MB/s',
			how: `Data rate × 8 bytes, one 64-bit module: ${short(rate)} MT/s × 8`
		}
	];
}

function ratioFact(name: string, top: number, bottom: number): DerivedFact {
	const together = synchronous(top, bottom) ? 'synchronous' : 'not synchronous';
	return {
		name,
		value: top / bottom,
		unit: '',
		how: `${short(top)} MHz ÷ ${short(bottom)} MHz; ${together}`
	};
}

/** Fabric : memory controller : memory, as two ratios, each saying whether the pair runs as one. */
function ratioFacts(settings: readonly SettingFact[]): DerivedFact[] {
	const rate = single(settings, 'memory-data-rate');
	if (rate === null) return [];
	const memory = memoryClockMHz(rate);
	const controller = single(settings, 'memory-controller-clock');
	const fabric = single(settings, 'fabric-clock');
	return [
		...(controller === null ? [] : [ratioFact('Memory clock to controller clock', memory, controller)]),
		...(fabric === null ? [] : [ratioFact('Fabric clock to memory clock', fabric, memory)])
	];
}

function powerFacts(settings: readonly SettingFact[]): DerivedFact[] {
	const before = asIn(settings, 'stockValue');
	const [clock, ...moreClocks] = clocksOf(settings);
	const [stockClock, ...moreStockClocks] = clocksOf(before);
	const volts = single(settings, 'core-voltage');
	const stockVolts = single(before, 'core-voltage');
	if (!clock || !stockClock || volts === null || stockVolts === null) return [];
	if (moreClocks.length > 0 || moreStockClocks.length > 0) return [];
	if (volts === stockVolts && clock.mhz === stockClock.mhz) return [];
	return [
		{
			name: 'Estimated dynamic power',
			value: dynamicPowerFactor({ volts, clock: clock.mhz }, { volts: stockVolts, clock: stockClock.mhz }),
			unit: '× stock',
			how: `V² × f against stock, leakage left out: (${short(volts)} V ÷ ${short(stockVolts)} V)² × ${short(clock.mhz)} MHz ÷ ${short(stockClock.mhz)} MHz`
		}
	];
}

/**
 * What follows from a profile's settings by arithmetic, ready to print with its formula. What cannot be told
 * (a word for a value, a unit that is missing, a quantity set in several places) is left out, never guessed.
 */
export const derivedFacts = (settings: readonly SettingFact[]): DerivedFact[] => [
	...coreFacts(settings),
	...memoryFacts(settings),
	...ratioFacts(settings),
	...powerFacts(settings)
];
