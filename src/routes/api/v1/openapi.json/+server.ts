import type { RequestEvent } from './$types';
import { json } from '$lib/server/http/api';
import { open } from '$lib/server/http/guarded';
import { openApi } from '$lib/server/http/openapi';
import { described } from '$lib/server/http/openapi-paths';

export const GET = open((_event: RequestEvent, ctx) => json(openApi(described, ctx.origin)));
