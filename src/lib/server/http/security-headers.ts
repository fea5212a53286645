import type { Handle } from '@sveltejs/kit';
import { env } from '../env';

const always: Record<string, string> = {
	'x-content-type-options': 'nosniff',
	'x-frame-options': 'DENY',
	'referrer-policy': 'strict-origin-when-cross-origin',
	'permissions-policy': 'camera=(self), geolocation=(), microphone=(), payment=(), usb=()',
	'cross-origin-opener-policy': 'same-origin',
	'cross-origin-resource-policy': 'same-origin'
};

/** The headers that every answer carries; the content security policy of pages, with its nonce, is the framework's. */
export const securityHeaders: Handle = async ({ event, resolve }) => {
	const answered = await resolve(event);
	// Some answers come with headers that cannot be changed: a copy can.
	const response = new Response(answered.body, answered);
	for (const [name, value] of Object.entries(always)) response.headers.set(name, value);
	if (env().ORIGIN.startsWith('https:'))
		response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains');
	if (!response.headers.has('content-security-policy'))
		response.headers.set('content-security-policy', "default-src 'none'; frame-ancestors 'none'");
	// What a signed-in person sees is theirs: no cache on the way keeps it.
	if (event.locals.actor && !response.headers.has('cache-control'))
		response.headers.set('cache-control', 'private, no-store');
	return response;
};
