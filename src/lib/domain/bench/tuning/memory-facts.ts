import type { DerivedFact } from '../../articles/data';
import type { SettingQuantity } from '../words';
import { clockRatio } from './clock-ratio';
import { decimalsUpTo, short } from './figures';
import { clockPeriodNs, memoryClockMHz, peakBandwidthMBs, synchronous, wordLatencyNs } from './memory';
import { single, type GroupedSetting } from './setting-values';

const timings: readonly [SettingQuantity, string, string][] = [
	['row-to-column-delay', 'Row to column delay', 'tRCD'],
	['row-precharge', 'Row precharge', 'tRP'],
	['row-active', 'Row active time', 'tRAS'],
	['row-cycle', 'Row cycle time', 'tRC'],
	['refresh-cycle', 'Refresh cycle time', 'tRFC']
];

/** A time given in memory clocks, in ns: the clock's period × clocks. */
function inNs(name: string, symbol: string, clocks: number | null, rate: number): DerivedFact[] {
	if (clocks === null) return [];
	const value = wordLatencyNs(rate, clocks);
	const how = `2000 × ${symbol} ÷ data rate: 2000 × ${short(clocks)} ÷ ${short(rate)} MT/s`;
	return [{ name, value, unit: 'ns', decimals: decimalsUpTo(value, 2), how }];
}

/** Clocks, times and bandwidth that follow from the memory's data rate and its timings. */
export function memoryFacts(settings: readonly GroupedSetting[]): DerivedFact[] {
	const rate = single(settings, 'memory-data-rate');
	if (rate === null) return [];
	const clock = memoryClockMHz(rate);
	const period = clockPeriodNs(rate);
	const bandwidth = peakBandwidthMBs(rate);
	return [
		{
			name: 'Memory clock',
			value: clock,
			unit: 'MHz',
			decimals: decimalsUpTo(clock, 1),
			how: `Data rate ÷ 2: ${short(rate)} MT/s ÷ 2`
		},
		{
			name: 'Memory clock period',
			value: period,
			unit: 'ns',
			decimals: decimalsUpTo(period, 4),
			how: `2000 ÷ data rate: 2000 ÷ ${short(rate)} MT/s`
		},
		...inNs('First-word latency', 'CAS latency', single(settings, 'cas-latency'), rate),
		...timings.flatMap(([quantity, name, symbol]) =>
			inNs(`${name}, ${symbol}`, symbol, single(settings, quantity), rate)
		),
		{
			name: 'Peak bandwidth of a module',
			value: bandwidth,
			unit: 'MB/s',
			decimals: decimalsUpTo(bandwidth, 1),
			how: `Data rate × 8 bytes, one 64-bit module: ${short(rate)} MT/s × 8`
		}
	];
}

/**
 * What the row cycle leaves over row active time and precharge, in clocks: a row is open, then closed, before the
 * next is opened, so tRC is their sum or more (public lists of DRAM timings; the standard itself was not seen).
 */
export function rowCycleFacts(settings: readonly GroupedSetting[]): DerivedFact[] {
	const cycle = single(settings, 'row-cycle');
	const active = single(settings, 'row-active');
	const precharge = single(settings, 'row-precharge');
	if (cycle === null || active === null || precharge === null) return [];
	return [
		{
			name: 'Row cycle less row active time and precharge',
			value: cycle - active - precharge,
			unit: 'clocks',
			decimals: 0,
			how: `tRC − (tRAS + tRP): ${short(cycle)} − (${short(active)} + ${short(precharge)})`
		}
	];
}

function ratioFact(name: string, top: number, bottom: number): DerivedFact {
	const together = synchronous(top, bottom) ? 'synchronous' : 'not synchronous';
	return {
		name,
		value: top / bottom,
		unit: '',
		decimals: decimalsUpTo(top / bottom, 4),
		how: `${short(top)} MHz ÷ ${short(bottom)} MHz; ${together}`
	};
}

/** Fabric : memory controller : memory, as pairs and, where all are set, as one ratio; each says whether it runs as one. */
export function ratioFacts(settings: readonly GroupedSetting[]): DerivedFact[] {
	const rate = single(settings, 'memory-data-rate');
	if (rate === null) return [];
	const memory = memoryClockMHz(rate);
	const controller = single(settings, 'memory-controller-clock');
	const fabric = single(settings, 'fabric-clock');
	const pairs = [
		...(controller === null ? [] : [ratioFact('Memory clock to controller clock', memory, controller)]),
		...(fabric === null ? [] : [ratioFact('Fabric clock to memory clock', fabric, memory)])
	];
	if (controller === null || fabric === null) return pairs;
	const clocks = [fabric, controller, memory] as const;
	const { text, together } = clockRatio(clocks);
	const value = Math.min(...clocks) / Math.max(...clocks);
	return [
		...pairs,
		{
			name: 'Fabric to controller to memory clock',
			value,
			unit: '',
			decimals: decimalsUpTo(value, 4),
			text,
			how: `${clocks.map(short).join(' : ')} MHz; ${together ? 'synchronous' : 'not synchronous'}; as one number, slowest ÷ fastest`
		}
	];
}
