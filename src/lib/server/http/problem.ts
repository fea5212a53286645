import type { Reason, Refusal } from '../../domain/shared/outcome';

const statuses: Record<Reason, { status: number; title: string }> = {
	invalid: { status: 422, title: 'Not accepted' },
	forbidden: { status: 403, title: 'Not allowed' },
	not_found: { status: 404, title: 'Not found' },
	conflict: { status: 409, title: 'Conflict' },
	gone: { status: 410, title: 'Gone' },
	too_large: { status: 413, title: 'Too large' },
	too_many: { status: 429, title: 'Too many attempts' }
};

export const statusOf = (reason: Reason): number => statuses[reason].status;
export const titleOf = (reason: Reason): string => statuses[reason].title;

/** An RFC 9457 problem document as a response. */
export function problem(
	status: number,
	title: string,
	detail: string,
	more: Record<string, unknown> = {}
): Response {
	return new Response(JSON.stringify({ type: 'about:blank', title, status, detail, ...more }), {
		status,
		headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store' }
	});
}

/** A refused outcome as a problem document; field errors come as `errors`. */
export const problemFrom = (refusal: Refusal): Response =>
	problem(statusOf(refusal.reason), titleOf(refusal.reason), refusal.message, {
		...(refusal.fields ? { errors: refusal.fields } : {}),
		...(refusal.detail === undefined ? {} : { context: refusal.detail })
	});

/** 401 for a script, which must send a token. */
export function notSignedIn(): Response {
	const response = problem(
		401,
		'Not signed in',
		'Send a personal token that has not run out: Authorization: Bearer calipress_…'
	);
	response.headers.set('www-authenticate', 'Bearer');
	return response;
}
