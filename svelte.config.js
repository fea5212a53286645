import adapter from '@sveltejs/adapter-node';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';
import { mdsvex } from 'mdsvex';
import { fileURLToPath } from 'node:url';

// The frame of pages that are written, not assembled.
const textPage = fileURLToPath(new URL('src/routes/(reader)/TextPage.svelte', import.meta.url));

/** @type {import('@sveltejs/kit').Config} */
export default {
	extensions: ['.svelte', '.svx'],
	preprocess: [vitePreprocess(), mdsvex({ extensions: ['.svx'], layout: textPage })],
	kit: {
		adapter: adapter({ precompress: true }),
		csp: {
			mode: 'nonce',
			directives: {
				'default-src': ['self'],
				'script-src': ['self'],
				'style-src': [
					'self',
					// The cursor while the editor's divider is dragged: three fixed rules of the pane library.
					'sha256-ejxaNqI9HE4qAX7B2hAfln6pnS37ktMxKSd3kZCKrvU=',
					'sha256-3E7V3vrrCp0FIalfwVOrEiZQA9GXrPxylQSBapcdnoM=',
					'sha256-XvJ01jaWVHkBTx63VEEV8Mmbn7pi9cbgzXIyweci36Q='
				],
				// Charts and the editor place things with style attributes; those cannot run script.
				'style-src-attr': ['unsafe-inline'],
				'img-src': ['self', 'data:'],
				'font-src': ['self'],
				'connect-src': ['self'],
				'object-src': ['none'],
				'base-uri': ['none'],
				'form-action': ['self'],
				'frame-ancestors': ['none']
			}
		}
	}
};
