import type { Cookies } from '@sveltejs/kit';
import { clock } from '../clock';
import type { Db } from '../db/client';
import { env } from '../env';
import { adapterOf } from './adapter';
import { newSecret } from './secret';

const dayMs = 86_400_000;
/** How long a session lasts after its last renewal; it is renewed at most once a day. */
export const sessionMs = 30 * dayMs;

export const isSecure = () => env().ORIGIN.startsWith('https:');
export const sessionCookie = () => `${isSecure() ? '__Secure-' : ''}authjs.session-token`;
export const cookieOptions = () => ({
	path: '/',
	httpOnly: true,
	sameSite: 'lax' as const,
	secure: isSecure()
});

/** The end a session should be given now, or null while it was renewed within the last day. */
export const renewedUntil = (expires: Date, now: Date): Date | null =>
	expires.getTime() - now.getTime() < sessionMs - dayMs ? new Date(now.getTime() + sessionMs) : null;

/** Signs a browser in: a new row and a new secret each time, whatever the browser held before. */
export async function startSession(db: Db, cookies: Cookies, userId: string): Promise<void> {
	const expires = new Date(clock.now().getTime() + sessionMs);
	const sessionToken = newSecret();
	const adapter = adapterOf(db);
	const before = cookies.get(sessionCookie());
	if (before) await adapter.deleteSession?.(before);
	await adapter.createSession?.({ sessionToken, userId, expires });
	cookies.set(sessionCookie(), sessionToken, { ...cookieOptions(), expires });
}

/** Signs this browser out. */
export async function endSession(db: Db, cookies: Cookies): Promise<void> {
	const sessionToken = cookies.get(sessionCookie());
	if (sessionToken) await adapterOf(db).deleteSession?.(sessionToken);
	cookies.delete(sessionCookie(), cookieOptions());
}
