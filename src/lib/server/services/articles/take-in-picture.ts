import { createHash } from 'node:crypto';
import { done, type Outcome } from '../../../domain/shared/outcome';
import { pictureAddress } from '../../../domain/articles/pictures/picture';
import type { PictureWords } from '../../../schemas/picture';
import type { Context } from '../../context';
import type { Db } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as pictures from '../../db/queries/picture';
import { files } from '../../files/files';
import { pictureKey } from '../../files/picture-key';
import { processPicture, type ProcessedPicture } from '../../files/process-picture';

/** A file that is to become a picture, with what is said of it. */
export interface SentPicture extends PictureWords {
	fileName: string;
	bytes: Uint8Array;
}

/** A picture as those who put it in see it. */
export interface StoredPicture {
	sha256: string;
	/** What to write in Markdown between the parentheses. */
	address: string;
	width: number;
	height: number;
	fallback: 'jpg' | 'png';
	bytes: number;
	alt: string;
	credit: string;
	/** Whether it was there already, whoever sent it first. */
	known: boolean;
	/** What of the file sent is not in the picture, in sentences. */
	notes: string[];
}

export const storedOf = (row: pictures.PictureRow, known: boolean, notes: string[] = []): StoredPicture => {
	const { sha256, width, height, fallback, bytes, alt, credit } = row;
	return {
		sha256,
		address: pictureAddress(sha256),
		width,
		height,
		fallback,
		bytes,
		alt,
		credit,
		known,
		notes
	};
};

/** A picture that is ready to be entered: its files are in the store already, which by itself shows nobody anything. */
export type ReadyPicture = { row: pictures.PictureRow; known: boolean; notes: string[] };

async function keepFiles({ sha256, whole, narrower, standIn }: ProcessedPicture): Promise<void> {
	const store = files();
	// The whole one last: where it is, the others are.
	await Promise.all([
		store.put(pictureKey(sha256, 'fallback'), standIn),
		...narrower.map(({ width, content }) => store.put(pictureKey(sha256, width), content))
	]);
	await store.put(pictureKey(sha256, 'whole'), whole);
}

/** Files that one act may bring, so that none holds the decoder for an hour. */
export const mostPictures = 200;

const hashOf = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/**
 * Makes pictures ready, those apart whose file is here already; nothing is entered yet. In the order they were sent. The
 * first that is no picture refuses them all, by its name unless there is but one to mean.
 */
export async function readyPictures(
	ctx: Context,
	sent: SentPicture[],
	named = true
): Promise<Outcome<ReadyPicture[], 'invalid' | 'too_many'>> {
	const uploads = sent.map(({ bytes }) => hashOf(bytes));
	const there = await pictures.byHashes(ctx.db, uploads);
	const rowOf = (rows: pictures.PictureRow[], hash: string) =>
		rows.find((row) => row.sha256 === hash || row.uploadSha256 === hash);
	const made = new Map<string, ProcessedPicture>();
	for (const [index, { bytes, fileName }] of sent.entries()) {
		const hash = uploads[index] ?? '';
		if (rowOf(there, hash) || made.has(hash)) continue;
		const one = await processPicture(bytes);
		if (!one.ok) return !named ? one : { ...one, message: `“${fileName}”: ${one.message}` };
		made.set(hash, one.value);
	}
	const same = await pictures.byHashes(
		ctx.db,
		[...made.values()].map((one) => one.sha256)
	);
	await Promise.all([...made.values()].filter((one) => !rowOf(same, one.sha256)).map(keepFiles));
	return done(
		sent.map(({ fileName, alt, credit }, index): ReadyPicture => {
			const upload = uploads[index] ?? '';
			const processed = made.get(upload);
			const known = rowOf(there, upload) ?? rowOf(same, processed?.sha256 ?? '');
			const notes = processed?.notes ?? [];
			if (known) return { row: known, known: true, notes };
			if (!processed) throw new Error('A picture was neither here nor made.');
			const { sha256, width, height, fallback, whole } = processed;
			const row = {
				...{ sha256, uploadSha256: upload, width, height, fallback },
				...{ mime: 'image/webp', bytes: whole.byteLength, alt, credit, fileName: fileName.slice(0, 200) },
				...{ storedBy: ctx.actor.id, storedAt: ctx.now }
			};
			return { row, known: false, notes };
		})
	);
}

/** A picture in the audit log: its hash, as much as fits there. */
export const subjectOf = (sha256: string): string => sha256.slice(0, 32);

/** Enters pictures that are ready, each once, with who and when. */
export async function enterPictures(ctx: Context, db: Db, ready: ReadyPicture[]): Promise<void> {
	const fresh = [...new Map(ready.filter((one) => !one.known).map(({ row }) => [row.sha256, row])).values()];
	await pictures.insert(db, fresh);
	await audit.append(
		db,
		fresh.map(({ sha256, width, height, bytes, fileName, alt }) => ({
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'picture.store',
			subjectKind: 'picture',
			subjectId: subjectOf(sha256),
			after: { sha256, width, height, bytes, fileName, alt }
		}))
	);
}
