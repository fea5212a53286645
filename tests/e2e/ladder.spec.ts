import { expect, test, type Page } from '@playwright/test';
import { signIn } from './support';

/** Pastes a text into the field that has the focus, as a spreadsheet's block arrives. */
const paste = (page: Page, text: string) =>
	page.evaluate((block) => {
		const clipboardData = new DataTransfer();
		clipboardData.setData('text/plain', block);
		document.activeElement?.dispatchEvent(
			new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true })
		);
	}, text);

test('a ladder is begun, climbed by form and by paste, and says what to try next', async ({ page }) => {
	await signIn(page, 'tester');
	await page.goto('/bench/ladders');
	await page.getByRole('link', { name: 'Begin a ladder' }).click();
	await page.waitForURL('**/bench/ladders/new');
	await page.getByRole('combobox', { name: 'Rig', exact: true }).selectOption('n-12');
	await page.getByRole('textbox', { name: 'Name', exact: true }).fill('Evening ladder');
	await page.getByRole('combobox', { name: 'Stress 1', exact: true }).selectOption('heat-soak');
	await page.getByLabel('Counts as passed after').first().fill('30');
	await page.getByRole('textbox', { name: 'Clock', exact: true }).fill('5000');
	await page.getByRole('textbox', { name: 'Core voltage', exact: true }).fill('1,3');
	await page.getByRole('textbox', { name: 'Temperature', exact: true }).fill('90');
	await page.getByRole('textbox', { name: 'Whose limits', exact: true }).fill('the maker’s data sheet');
	await page.getByRole('button', { name: 'Begin it' }).click();
	await page.waitForURL('**/bench/ladders/evening-ladder');

	const next = page.locator('[data-next="heat-soak"]');
	await page.getByRole('textbox', { name: 'Clock', exact: true }).fill('4800');
	await page.getByRole('textbox', { name: 'Core voltage', exact: true }).fill('1.2');
	await page.getByRole('textbox', { name: 'Hottest', exact: true }).fill('74');
	await page.getByRole('button', { name: 'Store the attempt' }).click();
	await expect(page.getByText('The attempt is stored.')).toBeVisible();
	// Nothing has failed: up by four steps of 25 MHz.
	await expect(next).toContainText('4900');

	await page.getByText('Several at once').click();
	await page.getByLabel('Clock, MHz, row 1').focus();
	await paste(
		page,
		'4900\t1.2\tHeat soak\t4\tfail\tcrash\t1\t78\t195\n4825\t1.2\tHeat soak\t30\tok\t\t\t75\t190\n'
	);
	await expect(page.getByLabel('What was seen, row 1')).toHaveValue('crash');
	await page.getByRole('button', { name: 'Store these attempts' }).click();
	await expect(page.getByText('2 attempts are stored.')).toBeVisible();
	// Between 4825 and 4900 lie three steps: half of them, rounded down, is one.
	await expect(next).toContainText('4850');
	await expect(page.locator('[data-kind="heaviest"]')).toContainText('4825');

	await page.getByRole('link', { name: /^Void/ }).first().click();
	await page.getByLabel('Reason').fill('the wrong profile was loaded');
	await page.getByRole('button', { name: 'Void the attempt' }).click();
	await expect(page.getByText('the wrong profile was loaded')).toBeVisible();
});

test('an attempt that is wrong says so beside its field and keeps what was typed', async ({ page }) => {
	await signIn(page, 'tester');
	await page.goto('/bench/ladders/aldermoor-1650-by-hand');
	await page.getByRole('combobox', { name: 'Outcome', exact: true }).selectOption('failed');
	await page.getByRole('textbox', { name: 'Notes', exact: true }).fill('fan noise at the end');
	await page.getByRole('button', { name: 'Store the attempt' }).click();
	await expect(page.getByText('Say what was seen, such as crash or error.')).toBeVisible();
	await expect(page.getByRole('textbox', { name: 'Notes', exact: true })).toHaveValue('fan noise at the end');
});

test('a sweep says where it crosses, what to set, and how a script sends a pass', async ({ page }) => {
	await signIn(page, 'tester');
	await page.goto('/bench/sweeps');
	await page.getByRole('link', { name: 'Aldermoor 1650, where to change over' }).click();
	await expect(page.locator('[data-switch="crosses"]')).toContainText('79.7');
	await expect(page.locator('[data-switch="crosses"]')).toContainText('Set the switch at 78 A');
	await expect(page.getByRole('img', { name: 'Aldermoor 1650, where to change over' }).first()).toBeVisible();
	await page.getByText('From a script').click();
	await expect(page.getByLabel('Command')).toContainText('/api/v1/sweeps/aldermoor-1650-switch/passes');

	await page
		.getByLabel('Points: threads, current in A, clock in MHz')
		.fill('1 14 5550\n2 23 5.5\n32 134 4590');
	await page.getByRole('button', { name: 'Store the pass' }).click();
	await expect(page.getByText(/Line 2: .*meant/)).toBeVisible();
	await page
		.getByLabel('Points: threads, current in A, clock in MHz')
		.fill('1 14 5550\n10 76 4985\n12 84 4910\n32 134 4590');
	await page.getByRole('button', { name: 'Store the pass' }).click();
	await expect(page.getByText('Pass 4 is stored.')).toBeVisible();
});

test('a writer reads ladders and changes none', async ({ page }) => {
	await signIn(page, 'writer');
	await page.goto('/bench/ladders/aldermoor-1650-by-hand');
	await expect(page.getByRole('heading', { name: 'What to try next' })).toBeVisible();
	await expect(page.getByRole('button', { name: 'Store the attempt' })).toHaveCount(0);
	await expect(page.getByRole('link', { name: /^Void/ })).toHaveCount(0);
});
