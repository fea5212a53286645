import { Auth, raw, skipCSRFCheck } from '@auth/core';
import { authConfig } from './auth';

/** Has Auth.js make a single-use link for a person and hand it to the outbox. Whether they may have one is decided before. */
export async function sendLink(origin: string, email: string, to: string): Promise<void> {
	const request = new Request(`${origin}/auth/signin/email`, {
		method: 'POST',
		headers: { 'content-type': 'application/x-www-form-urlencoded' },
		body: new URLSearchParams({ email, callbackUrl: `${origin}${to}` })
	});
	// `raw` makes a failure throw instead of becoming a redirect to an error page.
	await Auth(request, { ...authConfig(), raw, skipCSRFCheck });
}
