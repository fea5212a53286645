import { error } from '@sveltejs/kit';
import { guardedApi, valueOrError } from '$lib/server/http/guarded';
import { readDraftPlate, type PlateFile } from '$lib/server/services/articles/read-draft-plate';
import type { Look, Screen } from '$lib/server/rendering/screen-svg';
import type { RequestEvent } from './$types';

const types = { svg: 'image/svg+xml', csv: 'text/csv; charset=utf-8; header=present' } as const;

/** key.csv, key.svg, or key.1080p.dark.svg, set for a screen. */
function plateFileOf(file: string): PlateFile | null {
	const [, key, screen, look, kind] =
		/^([\w-]+)(?:\.(1080p|2160p)\.(light|dark))?\.(svg|csv)$/.exec(file) ?? [];
	if (key === undefined || (kind !== 'svg' && kind !== 'csv')) return null;
	if (screen === undefined) return { key, kind };
	return kind === 'svg' ? { key, kind, screen: { screen: screen as Screen, look: look as Look } } : null;
}

/** A plate of a text that is being written, as a file. */
export const GET = guardedApi('article.read', async ({ params }: RequestEvent, ctx) => {
	const asked = plateFileOf(params.file);
	if (!asked) error(404, 'There is no such plate.');
	const { kind } = asked;
	const body = valueOrError(await readDraftPlate(ctx, params.slug, asked));
	return new Response(body, {
		headers: {
			'content-type': types[kind],
			'cache-control': 'private, no-store',
			'content-disposition': `inline; filename="${params.slug}-${params.file}"`,
			// A drawing opened on its own may style itself and do nothing else.
			'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; font-src data:; sandbox"
		}
	});
});
