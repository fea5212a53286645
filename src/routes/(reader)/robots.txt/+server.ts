import { open } from '$lib/server/http/guarded';
import type { RequestEvent } from './$types';

const closed = ['/desk', '/bench', '/stores', '/partners', '/people', '/me', '/sign-in', '/invite', '/api'];

export const GET = open(
	(_event: RequestEvent, ctx) =>
		new Response(
			`User-agent: *\n${closed.map((path) => `Disallow: ${path}`).join('\n')}\nSitemap: ${ctx.origin}/sitemap.xml\n`,
			{ headers: { 'content-type': 'text/plain; charset=utf-8' } }
		)
);
