import DOMPurify from 'dompurify';
import { mayStay, sanitiseConfig } from '../domain/articles/sanitise-config';

let hooked = false;

/** The preview's last step, in the browser, by the same rules as the edition's. */
export function sanitisePreview(html: string): string {
	if (!hooked) {
		DOMPurify.addHook('uponSanitizeAttribute', (node, attribute) => {
			if (!mayStay(node.nodeName.toLowerCase(), attribute.attrName, attribute.attrValue)) {
				attribute.keepAttr = false;
			}
		});
		hooked = true;
	}
	return DOMPurify.sanitize(html, sanitiseConfig);
}
