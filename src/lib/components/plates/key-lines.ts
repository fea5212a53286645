import { labelLines, textWidth, type PlateSize } from './layout';

export interface KeyItem<T> {
	item: T;
	name: string;
	x: number;
	y: number;
}

/** Places the names of series above a drawing, in as many lines as they need. */
export function keyLines<T extends { name: string }>(
	items: readonly T[],
	size: PlateSize,
	left: number
): { items: KeyItem<T>[]; height: number } {
	const start = 6 - left;
	let x = start;
	let line = 0;
	const placed = items.map((item) => {
		const [name = ''] = labelLines(item.name, size.width - 40, 13, 1);
		const width = textWidth(name, 13) + 44;
		if (x > start && x + width > size.width - left) {
			x = start;
			line += 1;
		}
		const place = { item, name, x, y: 8 + line * 20 };
		x += Math.round(width);
		return place;
	});
	return { items: placed, height: (line + 1) * 20 + 12 };
}
