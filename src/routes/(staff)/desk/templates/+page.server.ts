import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listTemplates } from '$lib/server/services/articles/read-templates';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('article.read', async (_event: PageServerLoadEvent, ctx) => ({
	title: 'Templates',
	...valueOrError(await listTemplates(ctx))
}));
