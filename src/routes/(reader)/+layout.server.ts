import { open } from '$lib/server/http/guarded';
import { readPublication } from '$lib/server/services/shell/read-publication';
import type { LayoutServerLoadEvent } from './$types';

export const load = open(async (_event: LayoutServerLoadEvent, ctx) => ({
	publication: await readPublication(ctx)
}));
