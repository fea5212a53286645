import { open } from '$lib/server/http/guarded';

/** The process answers. */
export const GET = open(
	() => new Response('ok', { headers: { 'content-type': 'text/plain', 'cache-control': 'no-store' } })
);
