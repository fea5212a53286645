import type { RequestEvent } from '@sveltejs/kit';
import { refuse, type Outcome } from '../../domain/shared/outcome';

/** The largest JSON body the API reads. Logs stream on routes of their own. */
export const jsonLimitBytes = 2_000_000;

const tooLarge = () =>
	refuse(
		'too_large',
		`The body is larger than ${jsonLimitBytes / 1e6} MB. Nothing was stored; send it in parts.`
	);

async function read(request: Request): Promise<Outcome<string, 'too_large' | 'invalid'>> {
	if (Number(request.headers.get('content-length') ?? 0) > jsonLimitBytes) return tooLarge();
	const chunks: Uint8Array[] = [];
	let size = 0;
	// A body without a stated length is counted as it comes, so that it never stands in memory whole.
	const reader = request.body?.getReader();
	for (let part = await reader?.read(); part?.value; part = await reader?.read()) {
		size += part.value.byteLength;
		if (size > jsonLimitBytes) {
			await reader?.cancel();
			return tooLarge();
		}
		chunks.push(part.value);
	}
	try {
		return { ok: true, value: new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks)) };
	} catch {
		return refuse('invalid', 'The body is not UTF-8. Nothing was stored.');
	}
}

const kept = new WeakMap<Request, ReturnType<typeof read>>();

/** The body as text, read once and kept: its schema and its idempotency key both need it. */
export function readBody(event: Pick<RequestEvent, 'request'>): ReturnType<typeof read> {
	const there = kept.get(event.request) ?? read(event.request);
	kept.set(event.request, there);
	return there;
}
