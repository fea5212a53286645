import { isTheme } from '$lib/domain/people/theme';
import { open } from '$lib/server/http/guarded';
import { readBar } from '$lib/server/services/shell/read-bar';
import type { LayoutServerLoadEvent } from './$types';

/** Draws the frame and guards nothing: each page asks for the act that it needs. */
export const load = open(async ({ cookies }: LayoutServerLoadEvent, ctx) => {
	const chosen = cookies.get('theme');
	return { ...(await readBar(ctx)), theme: isTheme(chosen) ? chosen : ('system' as const) };
});
