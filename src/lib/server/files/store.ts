import type { Readable } from 'node:stream';

export interface StoredFile {
	bytes: number;
	stream: () => Readable;
}

/**
 * Where files are kept that the database only names. A key is written once and never changes, so that whoever has
 * the key has the content; a store elsewhere than on disk has the same two acts.
 */
export interface FileStore {
	/** Keeps a file whole or not at all; one that is there already stays. */
	put: (key: string, content: Uint8Array) => Promise<void>;
	/** The file, or null where there is none. */
	find: (key: string) => Promise<StoredFile | null>;
}
