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

/** Makes a picture ready, unless the same file is here already; nothing is entered yet. */
export async function readyPicture(
	ctx: Context,
	{ bytes, fileName, alt, credit }: SentPicture
): Promise<Outcome<ReadyPicture, 'invalid' | 'too_many'>> {
	const uploadSha256 = createHash('sha256').update(bytes).digest('hex');
	const there = await pictures.byHash(ctx.db, uploadSha256);
	if (there) return done({ row: there, known: true, notes: [] });
	const made = await processPicture(bytes);
	if (!made.ok) return made;
	const { sha256, width, height, fallback, whole, notes } = made.value;
	const same = await pictures.byHash(ctx.db, sha256);
	if (same) return done({ row: same, known: true, notes });
	await keepFiles(made.value);
	const row = {
		...{ sha256, uploadSha256, width, height, fallback },
		...{ mime: 'image/webp', bytes: whole.byteLength, alt, credit, fileName: fileName.slice(0, 200) },
		...{ storedBy: ctx.actor.id, storedAt: ctx.now }
	};
	return done({ row, known: false, notes });
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
