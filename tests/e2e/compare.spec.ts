import { expect, test } from '@playwright/test';
import { pageOf } from './support';

test('a comparison corrects its verdicts together and says what would settle the rest', async ({
	browser
}) => {
	const page = await pageOf(browser, 'tester');
	await page.goto('/bench/campaigns/aldermoor-1650-four-ways/compare');
	await expect(page.getByText('corrected for 24 comparisons (Holm)')).toBeVisible();
	// The geometric mean stands with its interval.
	const row = page.getByRole('row', { name: /^Switching at 78/ }).first();
	await expect(row.getByRole('cell').last()).toHaveText(/\+7\.\d\s%\s*\+7\.\d to \+7\.\d\s%/);
	await page.getByLabel('Against').selectOption({ label: 'Automatic boost' });
	await page.getByRole('button', { name: 'Show' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('Against Automatic boost');
	await expect(page.getByRole('heading', { name: 'Overall gain over Automatic boost' })).toBeVisible();

	// Five readings each of a loudness that hardly changed: not settled, and how many more would do it.
	await page.goto('/bench/campaigns/brisk-360-fans/compare');
	await expect(page.getByText(/cells have fewer than six readings/)).toBeVisible();
	await page.goto('/bench/campaigns/aldermoor-1650-costs/compare');
	// The demo's fixed clock: −4.6, +12.4, +14.8 and −0.6 % of work make +5.2 %; what it draws and wastes is not in it.
	const costs = page.getByRole('row', { name: /^Fixed 4\.95/ }).first();
	await expect(costs.getByRole('cell').last()).toHaveText(/^\s*\+5\.\d/);
	await expect(
		page
			.getByText(
				/Left out: .*Draw under render \(power\).*Loudness \(noise\).*They measure what a profile costs/
			)
			.first()
	).toBeVisible();
	const open = page.getByRole('heading', { name: 'What would settle it' });
	if ((await page.getByText('not enough runs to say', { exact: true }).count()) > 0)
		await expect(open).toBeVisible();
	else await expect(open).toHaveCount(0);
	await page.context().close();
});

test('trade-offs say in words what each strategy gains and gives up', async ({ browser }) => {
	const page = await pageOf(browser, 'tester');
	await page.goto('/bench/campaigns/aldermoor-1650-costs');
	await page.getByRole('link', { name: 'Trade-offs' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('Trade-offs against stock');
	const fixed = page.locator('dl > div', { hasText: 'Fixed 4.95' });
	await expect(fixed).toContainText(/Gains: all-core work \(Tile render \+12\.\d\s%/);
	await expect(fixed).toContainText(
		/Gives up: light-threaded work \(Prime sieve −4\.\d\s%\); power \(Draw under render \+/
	);
	await expect(page.getByRole('rowheader', { name: /Tile render: energy of a run/ })).toBeVisible();
	// The price comes with its day.
	await expect(
		page.getByText(/the price of Aldermoor 1650, 689 EUR on 20\d\d-\d\d-\d\d/).first()
	).toBeVisible();
	const [file] = await Promise.all([
		page.waitForEvent('download'),
		page.getByRole('link', { name: 'Download as CSV' }).click()
	]);
	expect(file.suggestedFilename()).toBe('aldermoor-1650-costs-trade-offs.csv');
	const plate = page.locator('figure').first();
	const [picture] = await Promise.all([
		page.waitForEvent('download'),
		plate.getByRole('button', { name: 'PNG' }).click()
	]);
	expect(picture.suggestedFilename()).toMatch(/^trade-off-over-stock-.*\.png$/);
	await page.context().close();
});

test('trade-offs print on one page, on A4 and on Letter', async ({ browser }) => {
	const page = await pageOf(browser, 'tester');
	for (const campaign of ['aldermoor-1650-four-ways', 'aldermoor-1650-costs']) {
		await page.goto(`/bench/campaigns/${campaign}/trade-offs`);
		await expect(page.getByRole('table', { name: 'What each profile gains and costs' })).toBeVisible();
		for (const format of ['A4', 'Letter']) {
			const pdf = (await page.pdf({ format })).toString('latin1');
			expect(pdf.match(/\/Type\s*\/Page\b/g), `${campaign} on ${format}`).toHaveLength(1);
		}
	}
	await page.context().close();
});

test('drift names its signals, and the board of what was measured meanwhile says so', async ({ browser }) => {
	const page = await pageOf(browser, 'tester');
	await page.goto('/bench/drift?rig=n-12&workload=tile-render');
	await expect(page.getByText('signal that the rig moved')).toBeVisible();
	const table = page.getByRole('table', { name: 'Runs that signal' });
	await expect(table.getByRole('row').nth(1)).toContainText('Above the upper limit');
	await expect(page.locator('figure svg:visible')).toHaveAttribute('role', 'img');
	// Another window: the shift itself held to be in order.
	await page.getByLabel('to run').fill('20');
	await page.getByRole('button', { name: 'Show' }).click();
	await expect(page).toHaveURL(/to=20/);
	await page.goto('/bench/campaigns/n-12-stock-over-time');
	await expect(page.getByText(/Measured while the rig was off: stock in Tile render/).first()).toBeVisible();
	await page.context().close();
});

test('the explorer holds its state in the link and works without JavaScript', async ({ browser }) => {
	const page = await pageOf(browser, 'tester');
	await page.goto('/bench/explore');
	await expect(page.getByRole('heading', { name: 'Choose a rig or a part' })).toBeVisible();
	const state = await page.context().storageState();
	await page.context().close();
	const plain = await (await browser.newContext({ javaScriptEnabled: false, storageState: state })).newPage();
	await plain.goto('/bench/explore');
	await plain.getByLabel('Rig').selectOption({ label: 'N-12' });
	await plain.getByRole('button', { name: 'Show' }).click();
	await plain.getByLabel('Tile render', { exact: true }).check();
	await plain.getByLabel('Plate').selectOption('scores');
	await plain.getByRole('button', { name: 'Show' }).click();
	await expect(plain).toHaveURL(/workload=tile-render/);
	await expect(plain.getByRole('heading', { name: 'Tile render', level: 2 })).toBeVisible();
	const address = plain.url();
	await plain.goto('/bench');
	await plain.goto(address);
	await expect(plain.getByLabel('Tile render', { exact: true })).toBeChecked();
	await expect(plain.getByRole('table', { name: 'What was found' })).toContainText('Stock');
	await plain.context().close();
});
