import { Unzip, UnzipInflate } from 'fflate';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { zipDirectory, type ListedEntry } from './zip-directory';

export interface ZipLimits {
	entries: number;
	/** Of all entries together, unpacked. */
	totalBytes: number;
	/** Of one entry, unpacked. */
	entryBytes: number;
	/** Unpacked to packed, for entries past a megabyte. */
	ratio: number;
}

export const zipLimits: ZipLimits = {
	entries: 1000,
	totalBytes: 120_000_000,
	entryBytes: 25_000_000,
	ratio: 200
};

const no = (message: string) => refuse('invalid', `${message} Nothing was changed.`);
const mega = (bytes: number) => `${Math.round(bytes / 1e6)} MB`;
/** What packing programs leave behind. */
const isLeftover = (name: string) => /(^|\/)(__MACOSX|\.DS_Store|Thumbs\.db|desktop\.ini)(\/|$)/.test(name);
const shown = (name: string) => `“${name.replace(/\p{Cc}/gu, '?').slice(0, 80)}”`;

/** What is wrong with a name, in words; null where nothing is. */
function nameFault(name: string): string | null {
	if (/\p{Cc}|\\/u.test(name) || name.length > 255)
		return `The zip has an entry with a name that cannot be used: ${shown(name)}.`;
	if (/^(\/|[a-z]:)/i.test(name)) return `The zip has an entry that names a place on a disk: ${shown(name)}.`;
	if (name.split('/').includes('..')) return `The zip has an entry that leads out of it: ${shown(name)}.`;
	return null;
}

function listFault(list: ListedEntry[], limits: ZipLimits): string | null {
	if (list.length > limits.entries)
		return `The zip has ${list.length} entries; at most ${limits.entries} are taken.`;
	const seen = new Set<string>();
	for (const { name, isLink, isLocked, bytes, packedBytes } of list) {
		const fault = nameFault(name);
		if (fault) return fault;
		if (seen.has(name)) return `The zip has two entries of one name: ${shown(name)}.`;
		seen.add(name);
		if (isLink) return `The zip has a link in the place of a file: ${shown(name)}.`;
		if (isLocked) return `The zip is locked with a password: ${shown(name)}.`;
		if (bytes > limits.entryBytes) return `${shown(name)} unpacks to more than ${mega(limits.entryBytes)}.`;
		if (bytes > 1_000_000 && bytes > packedBytes * limits.ratio)
			return `${shown(name)} unpacks to more than ${limits.ratio} times its size.`;
	}
	const total = list.reduce((sum, { bytes }) => sum + bytes, 0);
	return total > limits.totalBytes ? `The zip unpacks to more than ${mega(limits.totalBytes)}.` : null;
}

/** Small pieces, so that what one of them can unpack to stays small as well. */
const pieceBytes = 16_384;

/** Unpacks, counting what really comes out, whatever the list said. */
function unpack(
	bytes: Uint8Array,
	listed: ReadonlySet<string>,
	limits: ZipLimits
): Map<string, Uint8Array> | string {
	const files = new Map<string, Uint8Array>();
	let fault: string | null = null;
	let total = 0;
	const unzip = new Unzip((file) => {
		fault ??=
			nameFault(file.name) ??
			(listed.has(file.name) ? null : `The zip’s list does not have ${shown(file.name)}.`);
		if (fault !== null || file.name.endsWith('/') || isLeftover(file.name)) return;
		const chunks: Uint8Array[] = [];
		let size = 0;
		file.ondata = (error, chunk, final) => {
			if (error) fault ??= `${shown(file.name)} is damaged.`;
			if (fault !== null) return;
			size += chunk.byteLength;
			total += chunk.byteLength;
			if (size > limits.entryBytes)
				fault = `${shown(file.name)} unpacks to more than ${mega(limits.entryBytes)}.`;
			else if (total > limits.totalBytes) fault = `The zip unpacks to more than ${mega(limits.totalBytes)}.`;
			else if (chunk.byteLength > 0) chunks.push(chunk.slice());
			if (final) files.set(file.name, Buffer.concat(chunks));
		};
		file.start();
	});
	unzip.register(UnzipInflate);
	try {
		for (let at = 0; at < bytes.byteLength && fault === null; at += pieceBytes)
			unzip.push(bytes.subarray(at, at + pieceBytes), at + pieceBytes >= bytes.byteLength);
	} catch {
		fault ??= 'The zip is damaged.';
	}
	return fault ?? files;
}

export const isZip = (bytes: Uint8Array): boolean =>
	bytes[0] === 0x50 && bytes[1] === 0x4b && (bytes[2] === 3 || bytes[2] === 5);

/** The files of a zip by their names; what would fill the memory, or lead anywhere, is refused before it does. */
export function readZip(
	bytes: Uint8Array,
	limits: ZipLimits = zipLimits
): Outcome<Map<string, Uint8Array>, 'invalid'> {
	const list = zipDirectory(bytes);
	if (!list) return no('The zip is damaged or breaks off.');
	const fault = listFault(list, limits);
	if (fault) return no(fault);
	const files = unpack(bytes, new Set(list.map(({ name }) => name)), limits);
	if (typeof files === 'string') return no(files);
	const lost = list.find(({ name }) => !name.endsWith('/') && !isLeftover(name) && !files.has(name));
	return lost ? no(`${shown(lost.name)} is damaged.`) : done(files);
}
