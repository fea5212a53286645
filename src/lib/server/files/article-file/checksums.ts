import { createHash } from 'node:crypto';

/** The file that lists the others with their hashes, as `sha256sum -c` reads it. */
export const checksumFile = 'checksums.sha256';

export const sha256Of = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

export const writeChecksums = (files: { name: string; sha256: string }[]): string =>
	files.map(({ name, sha256 }) => `${sha256}  ${name}\n`).join('');

/** Names in a list of checksums whose files are there and are not as they were, or are gone. */
export function changedSince(list: string, fileOf: (name: string) => Uint8Array | undefined): string[] {
	return list.split(/\r?\n/).flatMap((line) => {
		const [, sha256, name] = /^([0-9a-f]{64}) [ *](.+)$/i.exec(line) ?? [];
		if (sha256 === undefined || name === undefined) return [];
		const file = fileOf(name);
		return file && sha256Of(file) === sha256.toLowerCase() ? [] : [name];
	});
}
