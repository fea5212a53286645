import type { RequestEvent } from './$types';
import { open } from '$lib/server/http/guarded';
import { problem } from '$lib/server/http/problem';

const nothing = (event: RequestEvent) =>
	problem(
		404,
		'Not found',
		`There is nothing at ${event.url.pathname}. The API is described at /api/v1/openapi.json.`
	);

export const GET = open(nothing);
export const POST = open(nothing);
export const PUT = open(nothing);
export const PATCH = open(nothing);
export const DELETE = open(nothing);
