/** Longest slug the tables hold. */
export const slugMaxLength = 80;

/** Addresses that the application uses itself beside a list's rows. */
const reserved = new Set(['new', 'edit', 'import', 'compare', 'history', 'revise']);

/** Latin letters that Unicode does not take apart into a base letter and a mark. */
const spelled: Record<string, string> = {
	ß: 'ss',
	æ: 'ae',
	œ: 'oe',
	ø: 'o',
	ð: 'd',
	đ: 'd',
	þ: 'th',
	ł: 'l',
	ħ: 'h',
	ı: 'i',
	ŋ: 'n',
	'×': 'x',
	'&': ' and ',
	'+': ' plus ',
	'%': ' percent ',
	µ: 'u',
	μ: 'u'
};

/** Whether a text is a slug: lower-case ascii words joined by hyphens, with a letter in it, so that no slug looks like an id. */
export const isSlug = (text: string): boolean =>
	text.length <= slugMaxLength && /^[a-z0-9]+(?:-[a-z0-9]+)*$/.test(text) && /[a-z]/.test(text);

/** Whether a slug is one of the words the application's own addresses use. */
export const isReserved = (slug: string): boolean => reserved.has(slug);

/**
 * The slug of a name: lower-case ascii words joined by hyphens, cut between words at 80 characters.
 * Empty when nothing of the name can be spelled in ascii; a name of digits alone gets an 'n' before it.
 * @example slugOf('Aldermoor 1650, Größe L') // 'aldermoor-1650-grosse-l'
 */
export function slugOf(text: string): string {
	const words = text
		.toLowerCase()
		.replace(/[^\p{ASCII}]|[&+%]/gu, (letter) => spelled[letter] ?? letter)
		.normalize('NFKD')
		.replace(/\p{M}/gu, '')
		// An apostrophe does not part a word.
		.replace(/['’]/g, '')
		.split(/[^a-z0-9]+/)
		.filter((word) => word !== '');
	let slug = '';
	for (const word of words) {
		const longer = slug === '' ? word.slice(0, slugMaxLength) : `${slug}-${word}`;
		if (longer.length > slugMaxLength) break;
		slug = longer;
	}
	return slug !== '' && !/[a-z]/.test(slug) ? `n${slug}`.slice(0, slugMaxLength) : slug;
}
