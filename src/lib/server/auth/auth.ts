import { SvelteKitAuth, type SvelteKitAuthConfig } from '@auth/sveltekit';
import type { Handle } from '@sveltejs/kit';
import { sameSitePath } from '../../domain/people/same-site';
import { database } from '../app';
import * as people from '../db/queries/people';
import { env } from '../env';
import { log } from '../log';
import { adapterOf } from './adapter';
import { linkProvider } from './link-provider';
import { cookieOptions, isSecure, sessionCookie, sessionMs } from './session-cookie';

/** Auth.js as this application uses it: e-mailed links over our tables, outbox and pages. Read per request, when there is a database. */
export function authConfig(): SvelteKitAuthConfig {
	const { db } = database();
	return {
		adapter: adapterOf(db),
		providers: [linkProvider],
		secret: env().AUTH_SECRET,
		trustHost: true,
		basePath: '/auth',
		useSecureCookies: isSecure(),
		session: { strategy: 'database', maxAge: sessionMs / 1000 },
		cookies: { sessionToken: { name: sessionCookie(), options: cookieOptions() } },
		pages: { signIn: '/sign-in', error: '/sign-in/link', verifyRequest: '/sign-in' },
		callbacks: {
			// A link signs in people we know; it never makes one.
			signIn: async ({ user }) => (await people.signInFacts(db, user.email ?? ''))?.mayEnter ?? false,
			redirect: ({ url, baseUrl }) =>
				baseUrl + sameSitePath(url.startsWith(baseUrl) ? url.slice(baseUrl.length) : url, '/desk')
		},
		logger: {
			error: (error) => log.warn({ kind: error.name }, 'a sign-in link was refused'),
			warn: (code) => log.debug({ code }, 'auth'),
			debug: () => undefined
		}
	};
}

const authjs = SvelteKitAuth(() => Promise.resolve(authConfig()));

/** The one door of Auth.js that is open from outside: the end of an e-mailed link. The rest goes through our own pages. */
export const authHandle: Handle = ({ event, resolve }) => {
	if (event.url.pathname !== '/auth/callback/email') return resolve(event);
	return authjs.handle({ event, resolve });
};
