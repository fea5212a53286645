import { positive } from './positive';

/** Clock in MHz = reference clock in MHz × ratio. RangeError for what is not above zero. @example clockMHz(100.5, 52) // 5226 */
export const clockMHz = (referenceMHz: number, ratio: number): number =>
	positive(referenceMHz, 'reference clock') * positive(ratio, 'ratio');

/** Change against a value above zero, in percent. @example changePercent(125, 100) // 25 */
export const changePercent = (now: number, before: number): number =>
	(now / positive(before, 'value before') - 1) * 100;
