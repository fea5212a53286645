const chunks = new Set(['VP8 ', 'VP8L', 'VP8X', 'ALPH']);
const text = (bytes: Uint8Array, at: number) => String.fromCharCode(...bytes.subarray(at, at + 4));

/**
 * Whether a WebP holds one still picture and nothing beside it: no position, no colour profile, no bytes after its end.
 * The container is RIFF: a length, then chunks with a name and a length, each padded to an even one.
 */
export function isCleanWebp(bytes: Uint8Array): boolean {
	if (bytes.byteLength < 20 || text(bytes, 0) !== 'RIFF' || text(bytes, 8) !== 'WEBP') return false;
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	if (view.getUint32(4, true) + 8 !== bytes.byteLength) return false;
	let at = 12;
	while (at + 8 <= bytes.byteLength) {
		if (!chunks.has(text(bytes, at))) return false;
		const length = view.getUint32(at + 4, true);
		at += 8 + length + (length % 2);
	}
	return at === bytes.byteLength;
}
