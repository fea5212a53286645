import { atom } from '$lib/domain/reader/atom';
import { open } from '$lib/server/http/guarded';
import { feedOf } from '$lib/server/services/reader/follow';
import type { RequestEvent } from './$types';

export const GET = open(
	async (_event: RequestEvent, ctx) =>
		new Response(atom(await feedOf(ctx)), {
			headers: {
				'content-type': 'application/atom+xml; charset=utf-8',
				'cache-control': 'public, max-age=0, must-revalidate'
			}
		})
);
