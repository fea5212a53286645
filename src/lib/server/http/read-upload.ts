import type { RequestEvent } from '@sveltejs/kit';
import { done, refuse, type Outcome } from '../../domain/shared/outcome';

/** The body as bytes, counted as they come: nothing past the limit is taken, whatever length was announced. */
export async function readUpload(
	{ request }: Pick<RequestEvent, 'request'>,
	limitBytes: number
): Promise<Outcome<Uint8Array, 'too_large' | 'invalid'>> {
	const tooLarge = refuse(
		'too_large',
		`The file is larger than ${limitBytes / 1e6} MB. Nothing was stored; send a smaller one.`
	);
	if (Number(request.headers.get('content-length') ?? 0) > limitBytes) return tooLarge;
	const chunks: Uint8Array[] = [];
	let size = 0;
	const reader = request.body?.getReader();
	try {
		for (let part = await reader?.read(); part?.value; part = await reader?.read()) {
			size += part.value.byteLength;
			if (size > limitBytes) {
				await reader?.cancel();
				return tooLarge;
			}
			chunks.push(part.value);
		}
	} catch {
		return refuse('invalid', 'The file broke off on its way. Nothing was stored; send it again.');
	}
	if (size === 0) return refuse('invalid', 'There is no file in this request. Nothing was stored.');
	return done(Buffer.concat(chunks));
}
