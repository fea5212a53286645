import type { Cookies, Handle } from '@sveltejs/kit';
import { isTheme } from '../../domain/people/theme';

const name = 'theme';

/** Writes the chosen look into the page before it leaves, so that it never flashes in another. */
export const theme: Handle = ({ event, resolve }) => {
	const chosen = event.cookies.get(name);
	const attribute = isTheme(chosen) && chosen !== 'system' ? `data-theme="${chosen}"` : '';
	return resolve(event, {
		transformPageChunk: ({ html }) => html.replace('data-theme="%theme%"', attribute)
	});
};

/** Keeps a choice of look for a year; the system's own needs no keeping. */
export function keepTheme(cookies: Cookies, chosen: unknown): void {
	if (!isTheme(chosen) || chosen === 'system') cookies.delete(name, { path: '/', httpOnly: false });
	else cookies.set(name, chosen, { path: '/', maxAge: 31_536_000, sameSite: 'lax', httpOnly: false });
}
