import { createHash } from 'node:crypto';
import type { PlateSpec } from '../../domain/articles/plates/spec';
import { drawPlate } from './draw-plate';

/** Drawings kept, the least lately used dropped first; some 20 kB each. */
const most = 400;
const kept = new Map<string, string>();

/** A plate's drawing for previews: drawn once for the same figures. Editions draw their own. */
export function plateDrawing(spec: PlateSpec): string {
	// A strong hash: the short key of a plate could be met by another spec on purpose.
	const key = createHash('sha256').update(JSON.stringify(spec)).digest('base64');
	const there = kept.get(key);
	const svg = there ?? drawPlate(spec);
	kept.delete(key);
	kept.set(key, svg);
	const oldest = kept.keys().next();
	if (kept.size > most && !oldest.done) kept.delete(oldest.value);
	return svg;
}
