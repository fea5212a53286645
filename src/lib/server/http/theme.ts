import type { Cookies, Handle } from '@sveltejs/kit';
import { isTheme } from '../../domain/people/theme';

const name = 'theme';

/** The two faces of every screen's first line; the rest come when the page asks for them. */
const firstFonts = /(instrument-sans-latin-wght|source-serif-4-latin-600)-normal/;

/** Writes the chosen look into the page before it leaves, and sends for its type early, so that neither flashes. */
export const theme: Handle = ({ event, resolve }) => {
	const chosen = event.cookies.get(name);
	const attribute = isTheme(chosen) && chosen !== 'system' ? `data-theme="${chosen}"` : '';
	return resolve(event, {
		transformPageChunk: ({ html }) => html.replace('data-theme="%theme%"', attribute),
		preload: ({ type, path }) => type === 'js' || type === 'css' || (type === 'font' && firstFonts.test(path))
	});
};

/** Keeps a choice of look for a year; the system's own needs no keeping. */
export function keepTheme(cookies: Cookies, chosen: unknown): void {
	if (!isTheme(chosen) || chosen === 'system') cookies.delete(name, { path: '/', httpOnly: false });
	else cookies.set(name, chosen, { path: '/', maxAge: 31_536_000, sameSite: 'lax', httpOnly: false });
}
