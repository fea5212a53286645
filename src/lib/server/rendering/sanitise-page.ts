import createDOMPurify, { type DOMPurify, type WindowLike } from 'dompurify';
import { JSDOM } from 'jsdom';
import { mayStay, sanitiseConfig } from '../../domain/articles/sanitise-config';

let shared: DOMPurify | undefined;

/** One window for the process: making one costs more than cleaning a page. It runs no script and loads nothing. */
function purifier(): DOMPurify {
	if (shared) return shared;
	const { window } = new JSDOM('');
	const purify = createDOMPurify(window as unknown as WindowLike);
	purify.addHook('uponSanitizeAttribute', (node, attribute) => {
		if (!mayStay(node.nodeName.toLowerCase(), attribute.attrName, attribute.attrValue)) {
			attribute.keepAttr = false;
		}
	});
	shared = purify;
	return purify;
}

/** A page as it may be shown: the last step of an edition, done once. Some 70 ms for a long article. */
export const sanitisePage = (html: string): string => purifier().sanitize(html, sanitiseConfig);

const comparison = { ...sanitiseConfig, ALLOWED_TAGS: [...sanitiseConfig.ALLOWED_TAGS, 'ins'] };

/** A part of a page with what was added to it marked. */
export const sanitiseComparison = (html: string): string => purifier().sanitize(html, comparison);
