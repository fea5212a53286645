import { randomUUID } from 'node:crypto';
import type { Handle } from '@sveltejs/kit';
import { log } from '../log';
import { life } from '../lifecycle';

/** Gives each request an id, answers with it, and logs one line: never a body, a query or a cookie. */
export const requestLog: Handle = async ({ event, resolve }) => {
	const started = performance.now();
	event.locals.requestId = randomUUID();
	const response = await resolve(event);
	response.headers.set('x-request-id', event.locals.requestId);
	if (life.draining) response.headers.set('connection', 'close');
	log.info(
		{
			requestId: event.locals.requestId,
			method: event.request.method,
			route: event.route.id ?? event.url.pathname,
			status: response.status,
			durationMs: Math.round((performance.now() - started) * 10) / 10,
			person: event.locals.actor?.id
		},
		'request'
	);
	return response;
};
