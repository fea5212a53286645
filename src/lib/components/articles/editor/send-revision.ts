import type { Draft, SaveAnswer, Theirs } from './autosave.svelte';

interface ProblemDocument {
	detail?: string;
	errors?: Record<string, string[]>;
	context?: Theirs;
}

const unreachable = (why: string): SaveAnswer => ({
	kind: 'unreachable',
	message: `Not saved: ${why}, kept in this browser.`
});

/** Sends a text to be saved as the next revision, and turns whatever comes back into an answer; it never throws. */
export async function sendRevision(address: string, draft: Draft & { basedOn: number }): Promise<SaveAnswer> {
	const { title, standfirst, source, basedOn } = draft;
	let response: Response;
	try {
		response = await fetch(address, {
			method: 'POST',
			headers: { 'content-type': 'application/json' },
			body: JSON.stringify({ title, standfirst, source, basedOn }),
			// A line that is cut without a word would otherwise hold everything up.
			signal: AbortSignal.timeout(30_000)
		});
	} catch {
		return unreachable('no connection');
	}
	if (response.status >= 500 || response.status === 429) return unreachable('the server did not answer well');
	const body = (await response.json().catch(() => null)) as unknown;
	if (response.ok)
		return { kind: 'saved', ...(body as Omit<Extract<SaveAnswer, { kind: 'saved' }>, 'kind'>) };
	const problem = (body ?? {}) as ProblemDocument;
	if (response.status === 401) return unreachable('you are signed out; sign in again in another tab');
	if (response.status === 409 && problem.context)
		return { kind: 'conflict', theirs: problem.context, message: problem.detail ?? '' };
	const first = Object.values(problem.errors ?? {})[0]?.[0];
	return {
		kind: 'refused',
		message: `Not saved: ${first ?? problem.detail ?? 'it was refused.'} It is kept in this browser.`
	};
}
