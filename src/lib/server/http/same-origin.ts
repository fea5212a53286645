import type { Handle } from '@sveltejs/kit';
import { env } from '../env';
import { problem } from './problem';

const reading = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses what another site makes a browser send. The framework checks forms; this covers JSON and everything else
 * that travels with a cookie. A script with a token sends no Origin, and is held by its token.
 */
export const sameOrigin: Handle = ({ event, resolve }) => {
	const origin = event.request.headers.get('origin');
	const foreign = origin !== null && origin !== new URL(env().ORIGIN).origin && origin !== event.url.origin;
	const crossSite = event.request.headers.get('sec-fetch-site') === 'cross-site';
	if (!reading.has(event.request.method) && (foreign || crossSite)) {
		return problem(403, 'Not allowed', 'This request came from another site. Nothing was changed.');
	}
	return resolve(event);
};
