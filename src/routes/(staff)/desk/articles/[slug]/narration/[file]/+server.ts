import { error } from '@sveltejs/kit';
import { scriptSubRip, scriptText } from '$lib/domain/articles/narration/script-files';
import { paceQuery } from '$lib/schemas/narration';
import { guardedApi, valueOrError } from '$lib/server/http/guarded';
import { readNarration } from '$lib/server/services/articles/read-narration';
import type { RequestEvent } from './$types';

const files = {
	'script.txt': { type: 'text/plain; charset=utf-8', write: scriptText },
	'script.srt': { type: 'application/x-subrip; charset=utf-8', write: scriptSubRip }
} as const;

/** The script as a file to read from or to put under a film. */
export const GET = guardedApi('article.read', async ({ params, url }: RequestEvent, ctx) => {
	const file = Object.hasOwn(files, params.file) ? files[params.file as keyof typeof files] : undefined;
	if (!file) error(404, 'A script comes as script.txt or script.srt.');
	const { pace } = paceQuery.parse(Object.fromEntries(url.searchParams));
	const { script } = valueOrError(await readNarration(ctx, params.slug));
	return new Response(file.write(script, pace), {
		headers: {
			'content-type': file.type,
			'cache-control': 'private, no-store',
			'content-disposition': `attachment; filename="${params.slug}-${params.file}"`
		}
	});
});
