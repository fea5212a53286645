import { positive } from './positive';

// Memory that transfers twice a clock: data rates in MT/s, clocks in MHz, times in ns. RangeError for what is not above zero.

/** Clock in MHz = data rate in MT/s ÷ 2. @example memoryClockMHz(6000) // 3000 */
export const memoryClockMHz = (dataRateMTs: number): number => positive(dataRateMTs, 'data rate') / 2;

/** Data rate in MT/s = clock in MHz × 2. @example dataRateMTs(1800) // 3600 */
export const dataRateMTs = (memoryClock: number): number => positive(memoryClock, 'memory clock') * 2;

/** Clock period tCK in ns = 2000 ÷ data rate. @example clockPeriodNs(3200) // 0.625 */
export const clockPeriodNs = (rateMTs: number): number => 2000 / positive(rateMTs, 'data rate');

/**
 * Time to a word of a burst in ns: CAS latency × 2000 ÷ data rate to the first, 1000 ÷ data rate more for each after.
 * @example wordLatencyNs(6000, 30) // 10
 */
export const wordLatencyNs = (rateMTs: number, casLatency: number, word = 1): number =>
	(2000 * positive(casLatency, 'CAS latency') + 1000 * (positive(word, 'word') - 1)) /
	positive(rateMTs, 'data rate');

/** Peak bandwidth in MB/s (decimal) of a bus, by default one 64-bit module. @example peakBandwidthMBs(6000) // 48000 */
export const peakBandwidthMBs = (rateMTs: number, busBits = 64): number =>
	(positive(rateMTs, 'data rate') * positive(busBits, 'bus width')) / 8;

/**
 * Whether two clocks run as one: equal to within half a megahertz, the rounding of menus that print 2666 for 2666⅔
 * (common practice, no source).
 */
export const synchronous = (aMHz: number, bMHz: number): boolean => Math.abs(aMHz - bMHz) <= 0.5;
