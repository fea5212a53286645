import type { Handle } from '@sveltejs/kit';
import { jsonLimitBytes } from './body';
import { problem } from './problem';

/** Routes that take files, each with a limit of its own; the server script lets no body through that is larger than the largest. */
export const uploadRoutes: Readonly<Record<string, number>> = {
	'/api/v1/pictures': 25_000_000,
	'/(staff)/desk/new/import': 60_000_000,
	'/(staff)/desk/articles/[slug]/import': 60_000_000
};

const isForm = (type: string) => /^(multipart\/form-data|application\/x-www-form-urlencoded)/i.test(type);

/**
 * Keeps what is no upload small. A form of no stated length is refused, for it would be read whole before anybody
 * counted; JSON is counted as it is read.
 */
export const bodyLimit: Handle = ({ event, resolve }) => {
	const { headers, body } = event.request;
	if (body === null) return resolve(event);
	const limit = uploadRoutes[event.route.id ?? ''] ?? jsonLimitBytes;
	const stated = headers.get('content-length');
	if (stated === null && isForm(headers.get('content-type') ?? ''))
		return problem(411, 'Length needed', 'Say how long the form is (Content-Length). Nothing was stored.');
	if (Number(stated ?? 0) > limit + 20_000)
		return problem(
			413,
			'Too large',
			`This is larger than the ${limit / 1e6} MB that are taken here. Nothing was stored.`
		);
	return resolve(event);
};
