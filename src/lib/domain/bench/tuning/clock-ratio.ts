import { synchronous } from './memory';
import { positive } from './positive';

export interface ClockRatio {
	/** Such as “2 : 3 : 3”; with decimals against the last where no small whole numbers fit. */
	text: string;
	/** Whether all of them run as one. */
	together: boolean;
}

const mostParts = 12;

/**
 * Clocks in MHz as one ratio in the smallest whole numbers up to 12 that fit each to half a megahertz (the rounding
 * of menus; common practice, no source). RangeError for what is not above zero.
 * @example clockRatio([2000, 3000, 3000]) // { text: '2 : 3 : 3', together: false }
 */
export function clockRatio(clocksMHz: readonly [number, ...number[]]): ClockRatio {
	clocksMHz.forEach((clock) => positive(clock, 'clock'));
	const last = clocksMHz.at(-1) ?? clocksMHz[0];
	const together = clocksMHz.every((clock) => synchronous(clock, last));
	for (let parts = 1; parts <= mostParts; parts += 1) {
		const whole = clocksMHz.map((clock) => Math.round((clock * parts) / last));
		const fit = whole.every(
			(count, at) =>
				count > 0 && count <= mostParts && synchronous((count * last) / parts, clocksMHz[at] ?? 0)
		);
		if (fit) return { text: whole.join(' : '), together };
	}
	return { text: clocksMHz.map((clock) => String(Number((clock / last).toFixed(3)))).join(' : '), together };
}
