import { refuse } from '../../../domain/shared/outcome';

/** The refusal of a full limit, with the wait in words and, for the header, in seconds. */
export function tooMany(waitMs: number, what: string, instead = '') {
	const seconds = Math.max(1, Math.ceil(waitMs / 1000));
	const minutes = Math.ceil(seconds / 60);
	const wait = seconds < 90 ? `${seconds} seconds` : `${minutes} minutes`;
	return refuse('too_many', [what, `Try again in ${wait}.`, instead].filter(Boolean).join(' '), {
		detail: { retryAfterSeconds: seconds }
	});
}
