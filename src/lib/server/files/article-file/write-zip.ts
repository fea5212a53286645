import { Zip, ZipDeflate, ZipPassThrough } from 'fflate';

export interface ZipEntry {
	name: string;
	/** Whether packing it saves anything; pictures are packed already. */
	packs: boolean;
	content: () => AsyncIterable<Uint8Array>;
}

/** A zip, piece by piece: no more of it is in memory than one piece of one file. */
export async function* writeZip(entries: ZipEntry[], at: Date): AsyncGenerator<Uint8Array> {
	let ready: Uint8Array[] = [];
	let failed: Error | null = null;
	const zip = new Zip((error, piece) => {
		if (error) failed = error;
		else ready.push(piece);
	});
	const taken = () => {
		if (failed) throw failed;
		const out = ready;
		ready = [];
		return out;
	};
	for (const { name, packs, content } of entries) {
		const file = packs ? new ZipDeflate(name, { level: 6 }) : new ZipPassThrough(name);
		file.mtime = at;
		zip.add(file);
		for await (const piece of content()) {
			file.push(piece);
			yield* taken();
		}
		file.push(new Uint8Array(), true);
		yield* taken();
	}
	zip.end();
	yield* taken();
}
