import { createHash } from 'node:crypto';
import { fileTypeFromBuffer } from 'file-type';
import sharp, { type Sharp } from 'sharp';
import {
	longestSidePx,
	narrowerWidths,
	pictureLimitPixels,
	type PictureFacts
} from '../../domain/articles/pictures/picture';
import { done, refuse, type Outcome } from '../../domain/shared/outcome';
import { isCleanWebp } from './clean-webp';

// One thread and no cache: a picture more slowly done is better than a page that waits.
sharp.concurrency(1);
sharp.cache(false);

/** A picture made fit to be kept: its files, and what is to be said of how they differ from what was sent. */
export interface ProcessedPicture extends PictureFacts {
	whole: Uint8Array;
	narrower: { width: number; content: Uint8Array }[];
	standIn: Uint8Array;
	notes: string[];
}

const taken: Record<string, string> = {
	'image/jpeg': 'JPEG',
	'image/png': 'PNG',
	'image/apng': 'PNG',
	'image/webp': 'WebP',
	'image/avif': 'AVIF',
	'image/gif': 'GIF',
	'image/tiff': 'TIFF'
};
const takenWords = 'JPEG, PNG, WebP, AVIF, GIF and TIFF are taken';
const standInWidth = 1280;
const decodeS = 30;
/** A lossless picture larger than this is kept lossy: it is a photograph, not a screen. */
const losslessMost = 3_000_000;

async function typeOf(bytes: Uint8Array): Promise<Outcome<string, 'invalid'>> {
	const found = await fileTypeFromBuffer(bytes);
	if (found && found.mime in taken) return done(found.mime);
	const what = found ? `a file of the kind ${found.mime}` : 'no picture that can be read';
	const hint = found && /hei[cf]/.test(found.mime) ? ' Save it as JPEG first.' : '';
	return refuse(
		'invalid',
		`This is ${what}, whatever its name says: ${takenWords}.${hint} Nothing was stored.`
	);
}

const grouped = (n: number) => new Intl.NumberFormat('en').format(n);

async function sizeOf(bytes: Uint8Array) {
	// The head alone is read here, whatever size it claims; nothing is decoded before that size is looked at.
	const { width = 0, height = 0, pages = 1 } = await sharp(bytes, { limitInputPixels: false }).metadata();
	if (width * height > pictureLimitPixels)
		return refuse(
			'invalid',
			`This picture has ${grouped(width)} × ${grouped(height)} pixels; at most ${grouped(pictureLimitPixels / 1e6)} million are taken. Scale it down first. Nothing was stored.`
		);
	return done({ frames: pages });
}

interface Raw {
	data: Buffer;
	width: number;
	height: number;
	channels: 1 | 2 | 3 | 4;
}

/** Decodes once: upright, in sRGB, scaled to fit, of an animation the first frame. */
async function decode(bytes: Uint8Array): Promise<Raw> {
	const { data, info } = await sharp(bytes, {
		limitInputPixels: pictureLimitPixels,
		failOn: 'error',
		pages: 1
	})
		.timeout({ seconds: decodeS })
		.autoOrient()
		.resize({ width: longestSidePx, height: longestSidePx, fit: 'inside', withoutEnlargement: true })
		.toColourspace('srgb')
		.raw({ depth: 'uchar' })
		.toBuffer({ resolveWithObject: true });
	return { data, width: info.width, height: info.height, channels: info.channels as Raw['channels'] };
}

const open = ({ data, width, height, channels }: Raw): Sharp =>
	sharp(data, { raw: { width, height, channels } });

async function wholeOf(
	raw: Raw,
	bytes: Uint8Array,
	mime: string
): Promise<{ content: Uint8Array; lossless: boolean }> {
	// Our own file come back, as from an exported article, keeps its hash.
	if (mime === 'image/webp' && isCleanWebp(bytes) && Math.max(raw.width, raw.height) <= longestSidePx) {
		const { width, height } = await sharp(bytes).metadata();
		if (width === raw.width && height === raw.height) return { content: bytes, lossless: false };
	}
	if (mime === 'image/png' || mime === 'image/gif') {
		const content = await open(raw).webp({ lossless: true, effort: 3 }).toBuffer();
		if (content.byteLength <= losslessMost) return { content, lossless: true };
	}
	return { content: await open(raw).webp({ quality: 84, effort: 4 }).toBuffer(), lossless: false };
}

async function make(bytes: Uint8Array, mime: string, frames: number): Promise<ProcessedPicture> {
	const raw = await decode(bytes);
	const { content: whole, lossless } = await wholeOf(raw, bytes, mime);
	const narrower: ProcessedPicture['narrower'] = [];
	for (const width of narrowerWidths(raw.width)) {
		const scaled = open(raw).resize({ width });
		narrower.push({
			width,
			content: await scaled.webp(lossless ? { nearLossless: true, quality: 60 } : { quality: 80 }).toBuffer()
		});
	}
	const clear = raw.channels === 4 || raw.channels === 2 ? !(await open(raw).stats()).isOpaque : false;
	const smaller = open(raw).resize({ width: standInWidth, withoutEnlargement: true });
	const standIn = await (
		clear ? smaller.png() : smaller.flatten({ background: '#fff' }).jpeg({ quality: 82 })
	).toBuffer();
	return {
		sha256: createHash('sha256').update(whole).digest('hex'),
		width: raw.width,
		height: raw.height,
		fallback: clear ? 'png' : 'jpg',
		whole,
		narrower,
		standIn,
		notes: frames > 1 ? ['It is animated: its first frame was kept.'] : []
	};
}

let lane: Promise<unknown> = Promise.resolve();
let waiting = 0;
const mostWaiting = 40;

/** One picture at a time: each may take 500 MB while it is decoded. */
async function inLane<T>(work: () => Promise<T>): Promise<T> {
	waiting += 1;
	const turn = lane.then(work);
	lane = turn.catch(() => undefined);
	try {
		return await turn;
	} finally {
		waiting -= 1;
	}
}

/**
 * Makes what was sent into what is kept: judged by its content, decoded and encoded anew, so that nothing of the file
 * itself (position, thumbnails, scripts behind a picture's name) is passed on. Refuses what is no picture.
 */
export async function processPicture(
	bytes: Uint8Array
): Promise<Outcome<ProcessedPicture, 'invalid' | 'too_many'>> {
	if (waiting >= mostWaiting)
		return refuse(
			'too_many',
			'Too many pictures are being taken in. Send it again in a minute. Nothing was stored.'
		);
	const type = await typeOf(bytes);
	if (!type.ok) return type;
	try {
		const size = await sizeOf(bytes);
		if (!size.ok) return size;
		return done(await inLane(() => make(bytes, type.value, size.value.frames)));
	} catch {
		return refuse(
			'invalid',
			`This ${taken[type.value]} cannot be decoded: it is damaged or breaks off. Send it again, or save it anew first. Nothing was stored.`
		);
	}
}
