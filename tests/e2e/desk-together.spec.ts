import { expect, test, type Browser, type Page } from '@playwright/test';
import { pageOf, type Role } from './support';

const campaign = 'aldermoor-1650-firmware-2-20';
const text = 'Alpha begins here.\n\nBravo is in the middle.\n\nCharlie comes last.\n';

/** A new article of the writer's with three paragraphs, imported from a file. */
async function articleOf(page: Page, title: string): Promise<string> {
	await page.goto('/desk/new/import');
	await page.locator('input[type=file]').setInputFiles({
		name: 'article.md',
		mimeType: 'text/markdown',
		buffer: Buffer.from(
			`---\ntitle: ${title}\nstandfirst: Three paragraphs.\ncampaigns: [${campaign}]\n---\n\n${text}`
		)
	});
	await page.getByRole('button', { name: 'Import the article' }).click();
	await page.getByRole('link', { name: 'Open it' }).click();
	await expect(page.locator('.cm-content')).toContainText('Alpha');
	return new URL(page.url()).pathname;
}

async function opened(browser: Browser, role: Role, path: string): Promise<Page> {
	const page = await pageOf(browser, role);
	await page.goto(path);
	await expect(page.locator('.cm-content')).toContainText('Alpha');
	return page;
}

/** Writes at the end of a paragraph of the source. */
async function write(page: Page, paragraph: string, words: string): Promise<void> {
	await page.locator('.cm-line', { hasText: paragraph }).click();
	await page.keyboard.press('End');
	await page.keyboard.insertText(words);
}

const saved = (page: Page, revision: number) =>
	expect(page.getByText(new RegExp(`Saved \\d\\d:\\d\\d, revision ${revision}$`))).toBeVisible();
const conflict = (page: Page) => page.getByRole('region', { name: 'Two of you changed this text' });

/** The newest text as the server has it. */
async function stored(page: Page, path: string): Promise<string> {
	await page.goto(path);
	const lines = page.locator('.cm-line');
	await expect(lines.first()).toContainText('Alpha');
	return (await lines.allInnerTexts()).map((line) => line.trim()).join('\n');
}

let writer: Page;
test.beforeAll(async ({ browser }) => {
	writer = await pageOf(browser, 'writer');
});
test.afterAll(() => writer.context().close());

test('two people who write in different paragraphs see each other, and take both with one press', async ({
	browser
}) => {
	const path = await articleOf(writer, 'Written by two at once');
	const editor = await opened(browser, 'editor', path);
	await expect(editor.getByRole('status').filter({ hasText: 'has this open' })).toBeVisible();

	await write(writer, 'Alpha', ' The writer was here.');
	await saved(writer, 2);
	await write(editor, 'Charlie', ' The editor was here.');
	await expect(conflict(editor)).toContainText('1 place you alone changed');
	await expect(conflict(editor).getByRole('radio')).toHaveCount(0);
	await conflict(editor).getByRole('button', { name: 'Take both together' }).press('Enter');
	await saved(editor, 3);
	await expect(editor.locator('.cm-content')).toContainText('The writer was here.');

	const all = await stored(writer, path);
	expect(all).toContain('Alpha begins here. The writer was here.');
	expect(all).toContain('Charlie comes last. The editor was here.');

	// The revisions page tells the two apart on the page, and takes a name.
	await editor.goto(`${path}/revisions?from=1&to=3`);
	const page = editor.getByRole('group', { name: 'From revision 1 to revision 3' });
	await expect(page.locator('ins')).toHaveText([' The writer was here.', ' The editor was here.']);
	await editor.getByText('Name it').last().click();
	await editor.getByLabel('Name of revision 3').fill('Both of us');
	await editor.getByRole('button', { name: 'Save the name' }).last().click();
	await expect(editor.getByText('It is called “Both of us” now.')).toBeVisible();
	await editor.goto(`${path}/revisions?named=true`);
	await expect(
		editor.getByRole('table', { name: 'Revisions, the newest first' }).locator('tbody tr')
	).toHaveCount(1);
	await editor.context().close();
});

test('in one paragraph, and in the title, the places are shown side by side and chosen by keyboard', async ({
	browser
}) => {
	const path = await articleOf(writer, 'Written by two in one place');
	const editor = await opened(browser, 'editor', path);
	await writer.getByLabel('Title').fill('The writer’s own title');
	await write(writer, 'Bravo', ' Loud, says the writer.');
	await saved(writer, 2);
	await editor.getByLabel('Title').fill('The editor’s own title');
	await write(editor, 'Bravo', ' Quiet, says the editor.');

	const places = conflict(editor).getByRole('group', { name: /^Place/ });
	await expect(places).toHaveCount(2);
	const take = conflict(editor).getByRole('button', { name: /both/ });
	await expect(take).toBeDisabled();
	await expect(places.nth(1)).toContainText('Loud, says the writer.');
	await places
		.nth(0)
		.getByRole('radio', { name: /^What .* wrote$/ })
		.first()
		.focus();
	await editor.keyboard.press('Space');
	await places
		.nth(1)
		.getByRole('radio', { name: /^Both, / })
		.last()
		.focus();
	await editor.keyboard.press('Space');
	await take.press('Enter');
	await saved(editor, 3);
	await expect(editor.getByLabel('Title')).toHaveValue('The writer’s own title');
	const all = await stored(writer, path);
	for (const words of ['Loud, says the writer.', 'Quiet, says the editor.'])
		expect(all.split(words)).toHaveLength(2);
	await editor.context().close();
});

test('a minute without a connection loses nothing and doubles nothing, also when somebody else wrote meanwhile', async ({
	browser
}) => {
	const path = await articleOf(writer, 'Written without a line');
	const away = await pageOf(browser, 'writer');
	await away.clock.install();
	await away.goto(path);
	await expect(away.locator('.cm-content')).toContainText('Alpha');
	const editor = await opened(browser, 'editor', path);

	await away.context().setOffline(true);
	await write(away, 'Alpha', ' Typed in a tunnel.');
	await away.clock.fastForward(5_000);
	await expect(away.getByText('Not saved: no connection, kept in this browser.')).toBeVisible();
	await write(editor, 'Charlie', ' Typed at the desk.');
	await saved(editor, 2);
	await away.clock.fastForward(60_000);
	await write(away, 'Bravo', ' Still in the tunnel.');
	await away.clock.fastForward(5_000);

	await away.context().setOffline(false);
	await expect(conflict(away)).toBeVisible();
	await conflict(away).getByRole('button', { name: 'Take both together' }).click();
	await saved(away, 3);
	const all = await stored(writer, path);
	for (const words of ['Typed in a tunnel.', 'Still in the tunnel.', 'Typed at the desk.'])
		expect(all.split(words), words).toHaveLength(2);

	// The page is closed before the line is back: the browser keeps the text and gives it back.
	await editor.goto(path);
	await editor.context().setOffline(true);
	await write(editor, 'Bravo', ' Closed too soon.');
	await expect(editor.getByText(/kept in this browser/)).toBeVisible();
	await editor.close({ runBeforeUnload: false });
	await editor.context().setOffline(false);
	const again = await editor.context().newPage();
	await again.goto(path);
	await again.getByRole('button', { name: 'Bring it back' }).click();
	await saved(again, 4);
	expect((await stored(writer, path)).split('Closed too soon.')).toHaveLength(2);
	await Promise.all([away.context().close(), again.context().close()]);
});

test('without scripts an article is exported, two texts are put together, and a file that cannot be read is refused with its line', async ({
	browser
}) => {
	const path = await articleOf(writer, 'Out and in again');
	const cookies = await writer.context().storageState();
	const plain = await (
		await browser.newContext({ javaScriptEnabled: false, storageState: cookies })
	).newPage();
	await plain.goto(path);
	const download = plain.waitForEvent('download');
	await plain.getByRole('link', { name: 'Export' }).click();
	const file = await (await download).path();
	await plain.goto(`${path}/import`);
	await plain.locator('input[type=file]').setInputFiles({
		name: 'article.zip',
		mimeType: 'application/zip',
		buffer: await import('node:fs/promises').then(({ readFile }) => readFile(file))
	});
	await plain.getByRole('button', { name: 'Import it as the next revision' }).click();
	await expect(plain.getByText('nothing had to be saved')).toBeVisible();

	// Somebody saves while the form is open: both texts can be taken with one press.
	await plain.goto(path);
	await write(writer, 'Alpha', ' With scripts.');
	await saved(writer, 2);
	const source = plain.getByLabel('Source');
	await source.fill(`${await source.inputValue()}\nWithout scripts.\n`);
	await plain.getByRole('button', { name: 'Save as a revision' }).click();
	await plain.getByRole('button', { name: 'Take both together' }).click();
	await expect(plain.getByLabel('Source')).toHaveValue(/With scripts\.[\s\S]*Without scripts\./);

	await plain.goto('/desk/new/import');
	await plain.locator('input[type=file]').setInputFiles({
		name: 'article.md',
		mimeType: 'text/markdown',
		buffer: Buffer.from('---\ntitle: "never closed\n---\nText.')
	});
	await plain.getByLabel('Title').fill('Kept as typed');
	await plain.getByRole('button', { name: 'Import the article' }).click();
	await expect(plain.getByRole('alert')).toContainText(/cannot be read, on line \d/);
	await expect(plain.getByLabel('Title')).toHaveValue('Kept as typed');
	await plain.context().close();
});
