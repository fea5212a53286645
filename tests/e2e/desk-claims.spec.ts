import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { pageOf } from './support';

// A number typed by hand that the bench has otherwise: seen while typing, bound, and printed from the bench.
test('a writer sees a number that contradicts the bench, binds it, and the page prints the stored value', async ({
	browser
}) => {
	const page = await pageOf(browser, 'writer');
	await page.goto('/desk/articles/firmware-2-20-do-the-verdicts-stand');
	const source = page.getByLabel('Source of the article, in Markdown');
	await source.click();
	await page.keyboard.press('Control+End');
	await page.keyboard.insertText('\n\nUnder stock the prime sieve takes 31.9 s, and the lamp draws 7 W.\n');

	const margin = page.getByRole('complementary', { name: 'Claims' });
	const note = margin.getByRole('listitem').filter({ hasText: '31.9 s' });
	await expect(note).toContainText('Contradicts the bench');
	await expect(note).toContainText('Prime sieve, Stock: 24.');
	await expect(margin.getByRole('listitem').filter({ hasText: '7 W' })).toContainText('Not backed');
	const counts = page.getByRole('button', { name: /1 contradicts, .*not backed/ });
	await expect(counts).toBeVisible();
	const { violations } = await new AxeBuilder({ page })
		.setLegacyMode(true)
		.withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
		.include('.editor')
		.analyze();
	expect(violations.map((one) => one.id)).toEqual([]);

	// From the count to the claim by keyboard, and what stands there is selected.
	await counts.focus();
	await page.keyboard.press('Enter');
	await expect(source).toBeFocused();

	const bind = note.getByRole('button', { name: /^Bind 31\.9 s as 24\./ });
	const prints = ((await bind.textContent()) ?? '').replace('Bind as ', '');
	expect(prints).toMatch(/^24\.\d+\u00a0s$/);
	await bind.click();
	await expect(source).toContainText('takes :reading{workload=prime-sieve profile=stock');
	const preview = page.getByRole('article', { name: 'The page as readers will have it' });
	await expect(preview).toContainText(`Under stock the prime sieve takes ${prints}, and the lamp`);
	await expect(page.getByRole('button', { name: /contradicts/ })).toHaveCount(0);

	// A number of somebody else's gets its source, and is no claim of ours any more.
	await margin.getByRole('button', { name: 'Name the source of 7 W' }).click();
	await page.keyboard.insertText('its maker');
	await expect(preview).toContainText('the lamp draws 7 W (its maker).');
	await expect(margin.getByRole('listitem').filter({ hasText: '7 W' })).toHaveCount(0);

	// On a narrow screen the same notes are a list.
	await page.setViewportSize({ width: 390, height: 844 });
	await expect(margin).toBeHidden();
	await page.getByText(/^Claims: /).click();
	await expect(page.locator('details').getByText('4.95 GHz')).toBeVisible();
	await page.context().close();
});
