import { deskFilter } from '$lib/schemas/article';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readDesk } from '$lib/server/services/articles/read-desk';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('article.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const filter = deskFilter.parse(Object.fromEntries(url.searchParams));
	return {
		title: 'Desk',
		filter,
		firstName: ctx.actor.name.split(' ')[0],
		...valueOrError(await readDesk(ctx, filter))
	};
});
