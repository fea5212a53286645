const base = 'https://same.invalid';

/**
 * The path to go to after sign-in, if it stays on this site; otherwise the fallback.
 * @example sameSitePath('/bench?sort=name', '/desk') // '/bench?sort=name'
 * @example sameSitePath('//elsewhere.example', '/desk') // '/desk'
 */
export function sameSitePath(wanted: string | null | undefined, fallback: string): string {
	// A browser reads a backslash as a slash and drops control characters: neither belongs in a path.
	if (!wanted?.startsWith('/') || /[\\\p{Cc}]/u.test(wanted) || !URL.canParse(wanted, base)) return fallback;
	const url = new URL(wanted, base);
	// `/.//elsewhere` stays on this site, but its path alone would not.
	if (url.origin !== base || url.pathname.startsWith('//')) return fallback;
	return url.pathname + url.search + url.hash;
}
