/** Sizes of a drawing: a wide one for the page, a narrow one that is read on a phone. */
export interface PlateSize {
	narrow: boolean;
	width: number;
}

export const wideSize: PlateSize = { narrow: false, width: 800 };
export const narrowSize: PlateSize = { narrow: true, width: 350 };

/** A rim of the sheet's colour behind figures, so that a line they cross does not strike them out. */
export const halo = {
	'paint-order': 'stroke',
	stroke: 'var(--color-sheet)',
	'stroke-width': 3.5,
	'stroke-linejoin': 'round'
} as const;

/** About how wide a text stands, in px: there is no measuring on the server. */
export const textWidth = (text: string, fontSize: number): number => text.length * fontSize * 0.56;

/**
 * A label in lines that fit a width, two at most, the rest as an ellipsis.
 * @example labelLines('Prime sieve', 160, 14) // ['Prime sieve']
 */
export function labelLines(text: string, width: number, fontSize: number, most = 2): string[] {
	const room = Math.max(4, Math.floor(width / (fontSize * 0.56)));
	const lines: string[] = [];
	let line = '';
	for (const word of text.split(/\s+/)) {
		const longer = line === '' ? word : `${line} ${word}`;
		if (longer.length <= room || line === '') line = longer;
		else {
			lines.push(line);
			line = word;
		}
	}
	lines.push(line);
	const kept = lines.slice(0, most);
	return kept.map((one, index) => {
		const cut = (index === most - 1 && lines.length > most) || one.length > room;
		return cut ? `${one.slice(0, room - 1).trimEnd()}…` : one;
	});
}

/** Main ticks and the finer ones between them, five to a step, as on a steel rule. */
export function graduation(
	ticks: readonly number[],
	[low, high]: readonly [number, number]
): { main: number[]; fine: number[] } {
	const step = ticks.length > 1 ? (ticks[1] ?? 0) - (ticks[0] ?? 0) : high - low;
	const fine: number[] = [];
	const start = (ticks[0] ?? low) - step;
	for (let index = 0; index <= (ticks.length + 2) * 5; index++) {
		const at = start + (index * step) / 5;
		const onMain = index % 5 === 0 && ticks.some((tick) => Math.abs(tick - at) < step / 100);
		if (!onMain && at >= low - step / 1e6 && at <= high + step / 1e6) fine.push(at);
	}
	return { main: [...ticks], fine };
}

/** Decimals that tell neighbouring ticks apart. */
export function tickDecimals(ticks: readonly number[]): number {
	const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0)) || 1;
	return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}
