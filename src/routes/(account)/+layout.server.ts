import { open } from '$lib/server/http/guarded';
import { readBar } from '$lib/server/services/shell/read-bar';
import type { LayoutServerLoadEvent } from './$types';

/** Draws the frame and guards nothing: each page asks for the act that it needs. */
export const load = open(async (_event: LayoutServerLoadEvent, ctx) => {
	const { publication, person } = await readBar(ctx);
	return { publication, person };
});
