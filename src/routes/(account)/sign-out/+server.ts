import { redirect } from '@sveltejs/kit';
import { endSession } from '$lib/server/auth/session-cookie';
import { open } from '$lib/server/http/guarded';
import type { RequestEvent } from './$types';

export const POST = open(async ({ cookies }: RequestEvent, ctx): Promise<Response> => {
	await endSession(ctx.db, cookies);
	redirect(303, '/sign-in');
});
