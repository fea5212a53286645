import type { Config } from 'dompurify';
import { isSafeLink, isSameSitePath } from './links';

/**
 * What may stand on a page, the same for the preview and the edition. DOMPurify is the last step of both:
 * nothing touches the markup after it.
 */
export const sanitiseConfig = {
	ALLOWED_TAGS: [
		...[
			'p',
			'h2',
			'h3',
			'h4',
			'h5',
			'h6',
			'br',
			'hr',
			'blockquote',
			'pre',
			'code',
			'em',
			'strong',
			'del',
			'a',
			'img',
			'picture',
			'source'
		],
		...['ul', 'ol', 'li', 'table', 'caption', 'thead', 'tbody', 'tfoot', 'tr', 'th', 'td'],
		...['figure', 'figcaption', 'details', 'summary', 'aside', 'section', 'div', 'span', 'nav'],
		...['dl', 'dt', 'dd', 'dfn', 'sup'],
		// Plates: shapes and words alone, nothing that links, embeds, animates or refers.
		...['svg', 'g', 'path', 'rect', 'circle', 'line', 'text', 'tspan', 'title', 'desc', '#text']
	],
	ALLOWED_ATTR: [
		...[
			'id',
			'class',
			'title',
			'href',
			'rel',
			'src',
			'alt',
			'srcset',
			'sizes',
			'type',
			'loading',
			'decoding',
			'start',
			'scope',
			'colspan',
			'role',
			'tabindex'
		],
		...['aria-label', 'data-line', 'data-plate', 'data-plate-file', 'data-rig', 'data-topic'],
		...['data-campaign', 'data-workload', 'data-profile', 'data-over', 'data-verdict'],
		...[
			'xmlns',
			'viewbox',
			'width',
			'height',
			'x',
			'y',
			'x1',
			'x2',
			'y1',
			'y2',
			'cx',
			'cy',
			'r',
			'd',
			'transform'
		],
		...[
			'fill',
			'fill-opacity',
			'stroke',
			'stroke-width',
			'stroke-opacity',
			'stroke-dasharray',
			'stroke-linejoin'
		],
		...['font-size', 'font-weight', 'text-anchor', 'paint-order', 'opacity', 'rx', 'ry']
	],
	// Words, not an address: “Caution: heat” would else be taken for one with a scheme of its own, and dropped.
	ADD_URI_SAFE_ATTR: ['aria-label'],
	ALLOW_DATA_ATTR: false,
	ALLOW_ARIA_ATTR: false,
	FORBID_TAGS: ['script', 'style', 'noscript', 'iframe', 'textarea', 'xmp', 'form', 'template', 'math'],
	// The words of what is refused would only puzzle a reader.
	KEEP_CONTENT: false,
	SANITIZE_DOM: true
} satisfies Config;

const candidate = String.raw`\/pictures\/[0-9a-f]{64}\.webp(?:\?w=\d{1,5})? \d{1,5}w`;
const storedPictures = new RegExp(`^${candidate}(?:, ${candidate}){0,5}$`);

const paint = /^(?:none|currentcolor|var\(--color-[a-z-]+\))$/i;

/**
 * A second look at each attribute that leads somewhere or could: DOMPurify lets a data: image pass, and a
 * paint may name an outside address. Returns whether the attribute may stay.
 */
export function mayStay(tag: string, name: string, value: string): boolean {
	if (name === 'href') return isSafeLink(value) || /^plates\/[\w.-]+$/.test(value);
	if (name === 'src') return tag === 'img' && isSameSitePath(value) && value.startsWith('/');
	if (name === 'srcset') return tag === 'source' && storedPictures.test(value);
	if (name === 'type') return tag === 'source' && value === 'image/webp';
	if (name === 'fill' || name === 'stroke') return paint.test(value);
	return true;
}
