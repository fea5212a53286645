import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { diskStore } from '../../src/lib/server/files/disk-store';
import type { FileStore } from '../../src/lib/server/files/store';

/** A file store of a test's own, found by services as the process's; returns what takes it away. */
export function useFiles(): () => void {
	const folder = mkdtempSync(join(tmpdir(), 'calipress-files-'));
	const kept = globalThis as typeof globalThis & { calipressFiles?: FileStore };
	kept.calipressFiles = diskStore(folder);
	return () => {
		kept.calipressFiles = undefined;
		rmSync(folder, { recursive: true, force: true });
	};
}
