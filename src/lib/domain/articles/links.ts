/**
 * A path of this site, from its root or within the page, that no browser reads as another site.
 * @example isSameSitePath('/methods/tile-render') === true; isSameSitePath('//elsewhere') === false
 */
export const isSameSitePath = (address: string): boolean =>
	// A browser reads a backslash as a slash and drops control characters.
	(/^#/.test(address) || /^\/(?!\/)/.test(address)) && !/[\\\p{Cc}]/u.test(address);

/** Where a link may lead: the web, a mail address, or a path of this site. */
export const isSafeLink = (address: string): boolean =>
	isSameSitePath(address) ||
	(/^https?:\/\/[^/\\?#]/i.test(address) && URL.canParse(address) && !/[\p{Cc}\s]/u.test(address)) ||
	/^mailto:[^\s@<>"]+@[^\s@<>"]+$/i.test(address);

/** `rel` of a link: other sites learn nothing of the window they are opened from. */
export const relOf = (address: string): string | undefined =>
	/^https?:/i.test(address) ? 'noopener external' : undefined;
