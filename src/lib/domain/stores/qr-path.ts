/** Modules left empty around a code: ISO/IEC 18004 asks for four. */
export const quietModules = 4;

/**
 * The dark modules of a QR code as one SVG path, a rectangle for each stretch of a row, in a box of
 * `size + 2 * quietModules` units.
 * @param size modules along a side
 * @param dark whether each module is dark, row by row
 */
export function qrPath(size: number, dark: ArrayLike<number | boolean>): string {
	const parts: string[] = [];
	for (let y = 0; y < size; y += 1) {
		for (let x = 0; x < size; x += 1) {
			const from = x;
			while (x < size && dark[y * size + x]) x += 1;
			if (x > from) parts.push(`M${from + quietModules} ${y + quietModules}h${x - from}v1h-${x - from}z`);
		}
	}
	return parts.join('');
}
