/** An entry as the list at the end of a zip has it. */
export interface ListedEntry {
	name: string;
	packedBytes: number;
	bytes: number;
	isLink: boolean;
	isLocked: boolean;
}

const endMark = 0x06054b50;
const entryMark = 0x02014b50;
/** The end mark may be followed by a comment of at most 65,535 bytes. */
const longestEnd = 65_557;

function endOf(view: DataView): number | null {
	for (let at = view.byteLength - 22; at >= Math.max(0, view.byteLength - longestEnd); at--)
		if (view.getUint32(at, true) === endMark) return at;
	return null;
}

/**
 * The list at the end of a zip (APPNOTE 6.3, sections 4.3.12 and 4.3.16): the one place that says which entries are
 * links, which the unpacking library does not tell. Null where there is none that can be read.
 */
export function zipDirectory(bytes: Uint8Array): ListedEntry[] | null {
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	const end = bytes.byteLength < 22 ? null : endOf(view);
	if (end === null) return null;
	const count = view.getUint16(end + 10, true);
	let at = view.getUint32(end + 16, true);
	const entries: ListedEntry[] = [];
	for (let index = 0; index < count; index++) {
		if (at + 46 > bytes.byteLength || view.getUint32(at, true) !== entryMark) return null;
		const nameLength = view.getUint16(at + 28, true);
		const madeBy = view.getUint8(at + 5);
		const mode = view.getUint32(at + 38, true) >>> 16;
		entries.push({
			name: new TextDecoder().decode(bytes.subarray(at + 46, at + 46 + nameLength)),
			packedBytes: view.getUint32(at + 20, true),
			bytes: view.getUint32(at + 24, true),
			// 3 is Unix, 19 is macOS; the file's kind is in the high bits of its mode.
			isLink: (madeBy === 3 || madeBy === 19) && (mode & 0xf000) === 0xa000,
			isLocked: (view.getUint16(at + 8, true) & 1) === 1
		});
		at += 46 + nameLength + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
	}
	return entries;
}
