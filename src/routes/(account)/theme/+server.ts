import { redirect, type RequestEvent } from '@sveltejs/kit';
import { sameSitePath } from '$lib/domain/people/same-site';
import { open } from '$lib/server/http/guarded';
import { keepTheme } from '$lib/server/http/theme';

/** The choice of look without script: keeps it and goes back to where it was made. */
export const POST = open(async ({ request, cookies, url }: RequestEvent) => {
	keepTheme(cookies, (await request.formData()).get('theme'));
	const from = request.headers.get('referer');
	const back = from?.startsWith(`${url.origin}/`) ? from.slice(url.origin.length) : null;
	redirect(303, sameSitePath(back, '/'));
});
