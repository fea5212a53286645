import type { Handle } from '@sveltejs/kit';
import { env } from '../env';
import always from './security-headers.json';

/**
 * The headers that every answer carries; pages have their own content security policy, with a nonce, from the framework.
 * The server script sets them too, for what is answered without coming through here: files, and early refusals.
 */
export const securityHeaders: Handle = async ({ event, resolve }) => {
	const answered = await resolve(event);
	// Some answers come with headers that cannot be changed: a copy can.
	const response = new Response(answered.body, answered);
	for (const [name, value] of Object.entries(always))
		if (name !== 'content-security-policy' || !response.headers.has(name)) response.headers.set(name, value);
	if (env().ORIGIN.startsWith('https:'))
		response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains');
	// What a signed-in person sees is theirs: no cache on the way keeps it.
	if (event.locals.actor && !response.headers.has('cache-control'))
		response.headers.set('cache-control', 'private, no-store');
	return response;
};
