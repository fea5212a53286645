import { previewChoice } from '$lib/schemas/template';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { previewTemplate } from '$lib/server/services/articles/read-templates';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('article.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const { campaign } = previewChoice.parse(Object.fromEntries(url.searchParams));
	const shown = valueOrError(await previewTemplate(ctx, params.template, campaign));
	return { title: shown.template.name, ...shown };
});
