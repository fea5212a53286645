import { expect, it } from 'vitest';
import { qrPath, quietModules } from './qr-path';

it('draws each stretch of a row as a rectangle, inside the quiet zone', () => {
	expect(qrPath(3, [1, 1, 0, 0, 0, 0, 1, 0, 1])).toBe('M4 4h2v1h-2zM4 6h1v1h-1zM6 6h1v1h-1z');
});

it('covers exactly the dark modules', () => {
	const size = 21;
	const dark = Array.from({ length: size * size }, (_, at) => (at * 7919) % 13 < 6);
	const drawn = new Set<number>();
	for (const [, x, y, width] of qrPath(size, dark).matchAll(/M(\d+) (\d+)h(\d+)/g))
		for (let step = 0; step < Number(width); step += 1)
			drawn.add((Number(y) - quietModules) * size + Number(x) - quietModules + step);
	expect([...drawn].sort((a, b) => a - b)).toEqual(dark.flatMap((on, at) => (on ? [at] : [])));
});
