import type { RequestEvent } from './$types';
import { open } from '$lib/server/http/guarded';
import { problem } from '$lib/server/http/problem';

const nothing = open((event: RequestEvent) =>
	problem(
		404,
		'Not found',
		`There is nothing at ${event.url.pathname}. The API is described at /api/v1/openapi.json.`
	)
);

export const GET = nothing;
export const POST = nothing;
export const PUT = nothing;
export const PATCH = nothing;
export const DELETE = nothing;
