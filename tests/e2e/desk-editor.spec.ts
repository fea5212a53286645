import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { pageOf } from './support';

// The editor as a writer uses it: source and page side by side, on an article of its own.
test.describe.configure({ mode: 'serial' });

const source = [
	'Opening words about the render.',
	'## First part',
	...Array.from(
		{ length: 12 },
		(_, n) => `Paragraph ${n + 1} says something about a fan, and it says it at some length.`
	),
	'::plate{kind=gains over=stock}',
	'## Second part',
	...Array.from(
		{ length: 12 },
		(_, n) => `Later paragraph ${n + 1} says something about a cooler, at some length.`
	),
	'The last words.'
].join('\n\n');

let page: Page;
const editor = () => page.locator('.cm-content');
const shown = () => page.getByRole('article');

/** What stands in the source, and on its cursor's line. */
const written = () =>
	page.evaluate(() => {
		const root = document.querySelector('.source-editor')?.shadowRoot;
		return [...(root?.querySelectorAll('.cm-line') ?? [])].map((line) => line.textContent).join('\n');
	});
const cursorLine = () =>
	page.evaluate(
		() => document.querySelector('.source-editor')?.shadowRoot?.querySelector('.cm-activeLine')?.textContent
	);

async function paste(data: Record<string, string>): Promise<void> {
	await editor().evaluate((target, given) => {
		const clipboard = new DataTransfer();
		for (const [type, text] of Object.entries(given)) clipboard.setData(type, text);
		target.dispatchEvent(
			new ClipboardEvent('paste', {
				clipboardData: clipboard,
				bubbles: true,
				cancelable: true,
				composed: true
			})
		);
	}, data);
}

async function atTheEnd(): Promise<void> {
	await editor().focus();
	await page.keyboard.press('ControlOrMeta+End');
	await page.keyboard.press('Enter');
	await page.keyboard.press('Enter');
}

test.beforeAll(async ({ browser }) => {
	page = await pageOf(browser, 'writer');
	await page.goto('/desk/new');
	await page.getByLabel('Title').fill('An editor put to use');
	await page.locator('input[name=template][value="short-note"]').check();
	await page.getByLabel(/Aldermoor 1650, four ways/).check();
	await page.getByRole('button', { name: 'Start the article' }).click();
	await page.waitForURL('**/desk/articles/an-editor-put-to-use');
	await editor().click();
	await page.keyboard.press('ControlOrMeta+a');
	await page.keyboard.insertText(source);
	await expect(shown()).toContainText('The last words.');
});
test.afterAll(() => page.context().close());

test('a directive is completed name by name, and shows its value under the source', async () => {
	await atTheEnd();
	// A list that has only just opened takes no Enter, lest it take one that was meant for the text: so it is clicked.
	const choose = (name: RegExp) => page.getByRole('option', { name }).first().click();
	await page.keyboard.type('It gains :gai');
	await choose(/:gain/);
	await choose(/^workload/);
	await page.keyboard.type('tile');
	await choose(/tile-render.*Tile render/);
	await page.keyboard.type(' pro');
	await choose(/^profile/);
	await page.keyboard.type('fixed-495');
	await page.keyboard.press('Escape');
	expect(await cursorLine()).toBe('It gains :gain{workload=tile-render profile=fixed-495}');
	await expect(page.getByRole('status').filter({ hasText: 'Tile render, Fixed 4.95' })).toContainText(
		'interval'
	);
	await expect(shown().locator('.gain')).toContainText('%');
});

test('a name that nobody knows is underlined and mended with one key', async () => {
	await atTheEnd();
	await page.keyboard.insertText('It takes :reading{workload=tile-rendr profile=stock} there.');
	await expect(page.locator('.cm-lintRange-error')).toHaveText('tile-rendr');
	await expect(shown().locator('.directive-error')).toContainText('tile-render');
	await page.keyboard.press('F8');
	await page.keyboard.press('ControlOrMeta+.');
	await expect(page.locator('.cm-lintRange-error')).toHaveCount(0);
	await expect(shown().locator('.reading')).toContainText('s');
	expect(await cursorLine()).toContain('workload=tile-render ');
});

test('the outline lists the headings, marks the one at the cursor, and goes there', async () => {
	await page.getByRole('button', { name: 'Outline' }).click();
	const outline = page.getByRole('navigation', { name: 'Outline' });
	await expect(outline.getByRole('button')).toHaveText(['First part', 'Second part']);
	await expect(outline.locator('[aria-current]')).toHaveText('Second part');
	await outline.getByRole('button', { name: 'First part' }).click();
	await expect.poll(cursorLine).toBe('## First part');
	await expect(outline.locator('[aria-current]')).toHaveText('First part');
	await page.getByRole('button', { name: 'Outline' }).click();
});

test('source and page scroll in step, both ways, and a click on the page goes to its source', async () => {
	const tops = () =>
		page.evaluate(() => {
			const code = document.querySelector('.source-editor')?.shadowRoot?.querySelector('.cm-scroller');
			const paper = document.querySelector('.page-preview');
			if (!code || !paper) throw new Error('no editor');
			const share = (one: Element) => one.scrollTop / (one.scrollHeight - one.clientHeight);
			return { source: share(code), page: share(paper) };
		});
	const scroll = (selector: string, top: number) =>
		page.evaluate(
			([name, to]) => {
				const code = document.querySelector('.source-editor')?.shadowRoot?.querySelector('.cm-scroller');
				const one = name === 'source' ? code : document.querySelector('.page-preview');
				if (one) one.scrollTop = to;
			},
			[selector, top] as const
		);
	await scroll('source', 1e6);
	await expect.poll(async () => (await tops()).page).toBeGreaterThan(0.99);
	await scroll('page', 0);
	await expect.poll(async () => (await tops()).source).toBeLessThan(0.01);
	await scroll('page', 900);
	await expect.poll(async () => (await tops()).source).toBeGreaterThan(0.05);
	await shown().getByText('Later paragraph 9').scrollIntoViewIfNeeded();
	await shown().getByText('Later paragraph 9').click();
	await expect.poll(cursorLine).toContain('Later paragraph 9');
	await expect(shown().locator('[data-current]')).toContainText('Later paragraph 9');
});

test('a word is found and replaced', async () => {
	await editor().focus();
	await page.keyboard.press('ControlOrMeta+f');
	await page.getByPlaceholder('Find', { exact: true }).fill('cooler');
	await page.getByPlaceholder('Replace with').fill('tower');
	await page.getByRole('button', { name: 'Replace all' }).click();
	await page.keyboard.press('Escape');
	await expect(shown().getByText(/about a tower/)).toHaveCount(12);
	await expect(shown()).not.toContainText('cooler');
});

test('a block of a spreadsheet becomes a table, a word processor’s text Markdown, and plain stays plain', async () => {
	await atTheEnd();
	await paste({ 'text/plain': 'Fan\tNoise, dB(A)\n40 %\t31.5\n60 %\t36.2' });
	await expect(shown().getByRole('cell', { name: '36.2' })).toBeVisible();
	await atTheEnd();
	await paste({
		'text/plain': 'What was heard',
		'text/html': '<h2>What was <b>heard</b></h2><p><img src="x.png">Little.</p>'
	});
	await expect(shown().getByRole('heading', { name: 'What was heard' })).toBeVisible();
	await expect(page.getByRole('status').filter({ hasText: 'A picture was left out' })).toBeVisible();
	await atTheEnd();
	await page.keyboard.down('ControlOrMeta');
	await page.keyboard.down('Shift');
	await page.keyboard.down('v');
	await paste({ 'text/plain': 'a\tb\nc\td' });
	for (const key of ['v', 'Shift', 'ControlOrMeta']) await page.keyboard.up(key);
	expect(await written()).toMatch(/a\s+b\nc\s+d/);
});

test('a key is changed, refused where another command has it, and put back', async () => {
	await editor().focus();
	await page.keyboard.press('ControlOrMeta+/');
	const dialog = page.getByRole('dialog', { name: 'Keys' });
	await dialog.getByRole('button', { name: 'Change the key of Outline' }).click();
	await page.keyboard.press('ControlOrMeta+s');
	await expect(dialog.getByRole('alert')).toContainText('Save now');
	await page.keyboard.press('F9');
	await dialog.getByRole('button', { name: 'Close' }).click();
	await editor().focus();
	await page.keyboard.press('F9');
	await expect(page.getByRole('navigation', { name: 'Outline' })).toBeVisible();
	await page.keyboard.press('F9');
	await page.keyboard.press('ControlOrMeta+/');
	await dialog.getByRole('button', { name: 'Put all keys back' }).click();
	await dialog.getByRole('button', { name: 'Close' }).click();
});

test('the source stands alone until Escape, and what can be inserted is shown in pictures', async () => {
	await editor().focus();
	await page.keyboard.press('Alt+Shift+S');
	// Nothing else can be reached.
	await expect(page.locator('[inert] a[href="/bench"]')).toBeAttached();
	await expect(shown()).toBeHidden();
	await page.keyboard.press('Escape');
	await expect(shown()).toBeVisible();
	await page.keyboard.press('ControlOrMeta+j');
	const dialog = page.getByRole('dialog', { name: 'Insert from the bench' });
	await dialog.getByRole('searchbox').fill('plate');
	await expect(dialog.locator('.thumb svg').first()).toBeAttached();
	const found = await new AxeBuilder({ page })
		.setLegacyMode(true)
		.withTags(['wcag2a', 'wcag2aa', 'wcag22aa'])
		.analyze();
	expect(found.violations.map(({ id, nodes }) => [id, nodes.map(({ html }) => html)])).toEqual([]);
	await dialog.getByText('Plate: scores').click();
	await dialog.getByRole('button', { name: 'Insert at the cursor' }).click();
	await expect(shown().locator('.plate')).toHaveCount(2);
});

test('a picture that is chosen is asked what it shows, and stands on the page', async () => {
	await atTheEnd();
	const png = await page.evaluate(async () => {
		const canvas = document.createElement('canvas');
		[canvas.width, canvas.height] = [640, 400];
		const pen = canvas.getContext('2d');
		pen?.fillRect(40, 40, 300, 200);
		return canvas.toDataURL('image/png').split(',')[1] ?? '';
	});
	await page
		.getByLabel('Pictures for the article')
		.setInputFiles({ name: 'rig.png', mimeType: 'image/png', buffer: Buffer.from(png, 'base64') });
	const dialog = page.getByRole('dialog', { name: 'A picture for the article' });
	await dialog.getByRole('button', { name: 'Insert the picture' }).click();
	await expect(dialog, 'not without words for those who cannot see it').toBeVisible();
	await dialog.getByLabel(/what it shows/i).fill('A dark field on a light one');
	await dialog.getByRole('button', { name: 'Insert the picture' }).click();
	await expect(dialog).toBeHidden();
	const shownPicture = shown().getByRole('img', { name: 'A dark field on a light one' });
	await expect(shownPicture).toBeVisible();
	const width = (image: HTMLImageElement) => image.decode().then(() => image.naturalWidth);
	expect(await shownPicture.evaluate(width), 'the store answers with a picture').toBeGreaterThan(0);
});
