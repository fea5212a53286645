import { deflateSync, crc32 } from 'node:zlib';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { processPicture, type ProcessedPicture } from './process-picture';

const plain = (width: number, height: number, channels: 3 | 4 = 3) =>
	sharp({
		create: {
			width,
			height,
			channels,
			background: channels === 4 ? { r: 20, g: 40, b: 90, alpha: 0.5 } : '#1d3f8f'
		}
	});

async function processed(bytes: Uint8Array): Promise<ProcessedPicture> {
	const outcome = await processPicture(bytes);
	if (!outcome.ok) throw new Error(outcome.message);
	return outcome.value;
}
const refused = async (bytes: Uint8Array) => {
	const outcome = await processPicture(bytes);
	return outcome.ok ? 'taken' : outcome.message;
};

/** A part of a PNG: length, name, content, CRC-32 (PNG 1.2, section 3.2). */
function part(name: string, content: Uint8Array): Buffer {
	const body = Buffer.concat([Buffer.from(name, 'latin1'), content]);
	const length = Buffer.alloc(4);
	length.writeUInt32BE(content.byteLength);
	const sum = Buffer.alloc(4);
	// Node 20.15 and newer have it.
	sum.writeUInt32BE(crc32(body));
	return Buffer.concat([length, body, sum]);
}

/** A grey PNG of one bit a pixel, as small as its size is great. */
function bomb(width: number, height: number): Buffer {
	const head = Buffer.alloc(13);
	head.writeUInt32BE(width, 0);
	head.writeUInt32BE(height, 4);
	head.set([1, 0, 0, 0, 0], 8);
	const rows = deflateSync(Buffer.alloc(Math.ceil(width / 8 + 1) * 200));
	return Buffer.concat([
		Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
		part('IHDR', head),
		part('IDAT', rows),
		part('IEND', new Uint8Array())
	]);
}

describe('a picture that is kept', () => {
	it('is upright, without its position or anything else the camera wrote', async () => {
		const shot = await plain(40, 20)
			.withExif({
				IFD0: { Make: 'Quillan' },
				IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '59/1 54/1 30/1' }
			})
			.withMetadata({ orientation: 6 })
			.jpeg()
			.toBuffer();
		expect(shot.includes('Quillan')).toBe(true);
		const kept = await processed(shot);
		expect([kept.width, kept.height]).toEqual([20, 40]);
		for (const file of [kept.whole, kept.standIn]) {
			const { exif, xmp, iptc, orientation } = await sharp(file).metadata();
			expect([exif, xmp, iptc, orientation ?? 1]).toEqual([undefined, undefined, undefined, 1]);
			expect(Buffer.from(file).includes('Quillan')).toBe(false);
		}
	});

	it('has no side longer than 2,560 px, narrower files beside it, and never one wider than itself', async () => {
		const wide = await processed(await plain(5120, 1000).jpeg().toBuffer());
		expect([wide.width, wide.height]).toEqual([2560, 500]);
		expect(wide.narrower.map((one) => one.width)).toEqual([640, 1280]);
		const sizes = await Promise.all(wide.narrower.map((one) => sharp(one.content).metadata()));
		expect(sizes.map(({ format, width, height }) => [format, width, height])).toEqual([
			['webp', 640, 125],
			['webp', 1280, 250]
		]);
		const small = await processed(await plain(300, 200).png().toBuffer());
		expect([small.width, small.narrower]).toEqual([300, []]);
	});

	it('keeps what can be seen through', async () => {
		const clear = await processed(await plain(30, 30, 4).png().toBuffer());
		expect(clear.fallback).toBe('png');
		expect((await sharp(clear.whole).stats()).isOpaque).toBe(false);
		expect((await processed(await plain(30, 30).png().toBuffer())).fallback).toBe('jpg');
	});

	it('comes back as it is: what was kept and is sent again has the same hash', async () => {
		const first = await processed(await plain(700, 500).jpeg().toBuffer());
		const again = await processed(first.whole);
		expect(again.sha256).toBe(first.sha256);
		// With something hidden behind its end it is made anew.
		const more = await processed(Buffer.concat([first.whole, Buffer.from('<script>')]));
		expect(Buffer.from(more.whole).includes('<script>')).toBe(false);
	});

	it('is the first frame of an animation, which is said', async () => {
		const frames = Buffer.concat([Buffer.alloc(300, 10), Buffer.alloc(300, 240)]);
		const moving = await sharp(frames, { raw: { width: 10, height: 20, channels: 3, pageHeight: 10 } })
			.gif({ delay: [100, 100] })
			.toBuffer();
		const kept = await processed(moving);
		expect([kept.width, kept.height]).toEqual([10, 10]);
		expect(kept.notes).toEqual([expect.stringContaining('first frame')]);
	});
});

describe('what is refused', () => {
	it('is a picture of 50,000 × 50,000 pixels, before it is decoded', async () => {
		const small = bomb(50_000, 50_000);
		expect(small.byteLength).toBeLessThan(100_000);
		expect(await refused(small)).toContain('50,000 × 50,000 pixels; at most 100 million');
	});

	it.each([
		['SVG', '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>'],
		['HTML', '<!doctype html><script>alert(1)</script>'],
		['text', 'a picture, honestly'],
		['nothing', ''],
		['PDF', '%PDF-1.7 and so on']
	])('is %s under the name of a picture', async (_, content) => {
		expect(await refused(Buffer.from(content))).toMatch(/whatever its name says: JPEG, PNG/);
	});

	it('is one that breaks off', async () => {
		const whole = await sharp({
			create: {
				width: 400,
				height: 400,
				channels: 3,
				background: '#777',
				noise: { type: 'gaussian', mean: 128, sigma: 60 }
			}
		})
			.jpeg()
			.toBuffer();
		expect(await refused(whole.subarray(0, whole.byteLength / 2))).toContain('damaged or breaks off');
	});
});
