// From a key to the page, in Debian's Chromium: the editor of the built application on an article of 4,000 words with 30
// plates, a key every tenth of a second. The control is the same key in the source itself.
import { loadavg, cpus } from 'node:os';
import { chromium } from '@playwright/test';
import { createConnection } from 'mysql2/promise';
import { createDatabase } from '../mariadb.mjs';
import { signedIn, startApp } from './app.mjs';
import { longArticle } from './long-article.mjs';

const keys = 80;
const betweenMs = 100;
const goalMs = 100;
/** Of the demo's lab. */
const path = '/desk/articles/automatic-boost-and-nothing-else';
const names = {
	workloads: ['prime-sieve', 'tile-render', 'source-build', 'video-encode', 'archive-pack', 'frame-walk'],
	profiles: ['stock', 'automatic-boost', 'fixed-470', 'fixed-495', 'switching-78'],
	baseline: 'stock'
};

/** @param {number[]} values */
const p95 = (values) => [...values].sort((a, b) => a - b)[Math.ceil(values.length * 0.95) - 1] ?? NaN;

/** Notes in the page when each key was pressed, and when what it changed was painted in source and page. */
function watch() {
	/** @param {Node} target @param {MutationObserverInit} changes */
	const timesOf = (target, changes) => {
		/** @type {number[]} */
		const took = [];
		/** Keys that are not seen yet; two may come to be seen together. @type {number[]} */
		let pressed = [];
		addEventListener('keydown', (event) => pressed.push(event.timeStamp), true);
		new MutationObserver(() => {
			const seen = pressed;
			pressed = [];
			if (seen.length === 0) return;
			requestAnimationFrame(() => {
				const { port1, port2 } = new MessageChannel();
				port1.onmessage = () => took.push(...seen.map((since) => performance.now() - since));
				port2.postMessage(null);
			});
		}).observe(target, changes);
		return took;
	};
	const page = document.querySelector('.page-preview article');
	const source = document.querySelector('.source-editor')?.shadowRoot?.querySelector('.cm-content');
	if (!page || !source) throw new Error('There is no editor.');
	const took = {
		page: timesOf(page, { childList: true }),
		source: timesOf(source, { childList: true, subtree: true, characterData: true })
	};
	Object.assign(globalThis, { took });
}

/**
 * @param {{ url: string }} server @param {{ smtpUrl: string }} mail @param {string} folder
 * @param {(figure: import('./figure.mjs').Figure) => void} print
 */
export async function measureEditor(server, mail, folder, print) {
	const database = await createDatabase(server.url, 'bench_editor');
	const app = await startApp({ database, smtp: mail.smtpUrl, folder, demo: 'on' });
	const browser = await chromium.launch({
		executablePath: process.env.CHROMIUM || '/usr/bin/chromium',
		args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking']
	});
	try {
		const connection = await createConnection({ uri: database });
		const [rows] = await connection.query("select id from user where email = 'writer@northlight.example'");
		await connection.end();
		const [{ id }] = /** @type {[{ id: string }]} */ (rows);
		const [name = '', value = ''] = (await signedIn(database, id)).split('=');
		const context = await browser.newContext({ viewport: { width: 1440, height: 1000 } });
		await context.addCookies([{ name, value, url: app.origin }]);
		const page = await context.newPage();
		await page.goto(app.origin + path);
		const editor = page.locator('.cm-content');
		await editor.click();
		await page.keyboard.press('ControlOrMeta+a');
		const [before = '', after = ''] = longArticle(names).split(/(?<=\n\n)(?=## Part 7)/);
		await page.keyboard.insertText(after);
		await page.keyboard.press('ControlOrMeta+Home');
		await page.keyboard.insertText(`${before}Typed here `);
		await page.waitForFunction(
			() =>
				document.querySelectorAll('.page-preview .plate svg').length >= 30 &&
				!document.querySelector('.page-preview .plate-waiting'),
			undefined,
			{ timeout: 120_000 }
		);
		await page.waitForTimeout(2000);
		await page.evaluate(watch);
		for (let n = 0; n < keys; n++) {
			await page.keyboard.press(n % 6 === 5 ? 'Space' : 'e');
			await page.waitForTimeout(betweenMs);
		}
		await page.waitForTimeout(1000);
		const took = await page.evaluate(
			() =>
				/** @type {{ took: { page: number[], source: number[] } }} */ (/** @type {unknown} */ (globalThis))
					.took
		);
		// A key that never came to the page is no fast one.
		const all = took.page.length === keys;
		const key = all ? p95(took.page) : NaN;
		print({
			name: 'editor.key.p95.ms',
			value: key,
			control: p95(took.source),
			goal: `<${goalMs}`,
			met: key < goalMs
		});
		print({
			name: 'editor.machine.load',
			value: loadavg()[0] ?? NaN,
			control: cpus().length,
			goal: 'told',
			met: true
		});
	} finally {
		await browser.close();
		await app.stop();
	}
}
