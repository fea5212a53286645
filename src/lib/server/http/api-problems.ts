import type { Handle } from '@sveltejs/kit';
import { problem } from './problem';

const titles: Record<number, string> = { 404: 'Not found', 405: 'Method not allowed', 413: 'Too large' };

/** The framework's own errors are plain words, or `{ message }`. */
async function wordsOf(response: Response): Promise<string> {
	const type = response.headers.get('content-type') ?? '';
	if (type.startsWith('text/plain')) return response.text();
	if (!type.startsWith('application/json')) return '';
	const body = (await response.json()) as { message?: unknown };
	return typeof body.message === 'string' ? body.message : '';
}

/** What went wrong in the words of a page becomes a problem document for a script. */
async function problemOf(response: Response): Promise<Response> {
	const { status, headers } = response;
	const detail =
		status >= 500
			? 'Something failed on our side. Try again.'
			: status === 405
				? `This address answers ${headers.get('allow') ?? 'other methods'}.`
				: await wordsOf(response);
	const title = titles[status] ?? (status >= 500 ? 'Failed' : 'Not accepted');
	const answer = problem(status, title, detail || title);
	for (const name of ['allow', 'retry-after']) {
		const value = headers.get(name);
		if (value) answer.headers.set(name, value);
	}
	return answer;
}

/** Under /api/ every error is a problem document (RFC 9457), whoever answered it. */
export const apiProblems: Handle = async ({ event, resolve }) => {
	const response = await resolve(event);
	const isProblem = response.headers.get('content-type')?.startsWith('application/problem+json') ?? false;
	return event.url.pathname.startsWith('/api/') && response.status >= 400 && !isProblem
		? problemOf(response)
		: response;
};
