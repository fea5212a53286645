import { guarded, valueOrError } from '$lib/server/http/guarded';
import { textStream } from '$lib/server/http/text-stream';
import { exportReadings } from '$lib/server/services/bench/export-readings';
import type { RequestEvent } from './$types';

export const GET = guarded('bench.read', async ({ params }: RequestEvent, ctx) => {
	const { slug, text } = valueOrError(await exportReadings(ctx, params.campaign));
	return new Response(textStream(text), {
		headers: {
			'content-type': 'text/csv; charset=utf-8',
			'content-disposition': `attachment; filename="${slug}-readings.csv"`,
			'cache-control': 'no-store'
		}
	});
});
