import { join } from 'node:path';
import { env } from '../env';
import { diskStore } from './disk-store';
import type { FileStore } from './store';

const kept = globalThis as typeof globalThis & { calipressFiles?: FileStore };

/** The file store of this process: the folder `files` of the data folder, which belongs into every backup. */
export const files = (): FileStore => (kept.calipressFiles ??= diskStore(join(env().DATA_DIR, 'files')));
