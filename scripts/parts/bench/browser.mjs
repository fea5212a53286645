// Modules of the domain in Debian's Chromium, bundled as the application's own are.
import { chromium } from '@playwright/test';
import { build } from 'vite';

const args = [
	'--no-sandbox',
	'--disable-gpu',
	'--disable-quic',
	'--no-first-run',
	'--disable-background-networking'
];

/** Bundles a few lines of code with all that they import into one script. @param {string} code @returns {Promise<string>} */
async function bundled(code) {
	const entry = 'virtual:bench-entry';
	const made = await build({
		configFile: false,
		logLevel: 'error',
		plugins: [
			{
				name: 'bench-entry',
				resolveId: (id) => (id === entry ? `\0${entry}` : null),
				load: (id) => (id === `\0${entry}` ? code : null)
			}
		],
		build: {
			write: false,
			target: 'es2022',
			rolldownOptions: { input: entry, output: { format: 'iife', name: 'bench' } }
		}
	});
	const outputs = [made].flat().flatMap((one) => ('output' in one ? one.output : []));
	const chunk = outputs.find((one) => one.type === 'chunk');
	if (chunk?.type !== 'chunk') throw new Error('Nothing was bundled for the browser.');
	return chunk.code;
}

/**
 * Runs bundled code on an empty page: its `run` is called with a value and gives a number.
 * @param {string} code a module that sets `globalThis.run`
 * @param {unknown} input plain data
 * @returns {Promise<number>}
 */
export async function inBrowser(code, input) {
	const script = await bundled(code);
	const browser = await chromium.launch({
		executablePath: process.env.CHROMIUM || '/usr/bin/chromium',
		args
	});
	try {
		const page = await browser.newPage();
		await page.addScriptTag({ content: script });
		return await page.evaluate((value) => /** @type {any} */ (globalThis).run(value), input);
	} finally {
		await browser.close();
	}
}
