import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { FileStore } from './store';

const keyShape = /^[a-z0-9]+(?:[/.-][a-z0-9]+)*$/;

/** Written beside its place, flushed, then moved there: a file that can be found is whole, whatever ended in between. */
async function writeWhole(path: string, content: Uint8Array): Promise<void> {
	await mkdir(dirname(path), { recursive: true });
	const beside = `${path}.${randomUUID()}.part`;
	try {
		const file = await open(beside, 'wx', 0o640);
		try {
			await file.writeFile(content);
			await file.sync();
		} finally {
			await file.close();
		}
		await rename(beside, path);
	} catch (error) {
		await rm(beside, { force: true });
		throw error;
	}
}

const sizeOf = async (path: string): Promise<number | null> => {
	try {
		const found = await stat(path);
		return found.isFile() ? found.size : null;
	} catch {
		return null;
	}
};

/** Files in a folder of this machine. */
export function diskStore(folder: string): FileStore {
	const pathOf = (key: string) => {
		if (!keyShape.test(key)) throw new Error(`“${key}” is no key of a stored file.`);
		return join(folder, key);
	};
	return {
		async put(key, content) {
			const path = pathOf(key);
			if ((await sizeOf(path)) !== content.byteLength) await writeWhole(path, content);
		},
		async find(key) {
			const path = pathOf(key);
			const bytes = await sizeOf(path);
			return bytes === null ? null : { bytes, stream: () => createReadStream(path) };
		}
	};
}
