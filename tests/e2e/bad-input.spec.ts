import { expect, test } from '@playwright/test';
import { address, pageOf, signIn } from './support';

const script = `<script>document.title='executed'</script><img src=x onerror="document.title='executed'">`;

test('a wrong password says so, keeps the address, and too many attempts have to wait', async ({ page }) => {
	await page.goto('/sign-in');
	const email = page.locator('form[action="?/password"] input[name=email]');
	await email.fill('nobody@northlight.example');
	await page.locator('input[name=password]').fill('wrong');
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await expect(page.getByRole('alert').first()).toBeVisible();
	await expect(email).toHaveValue('nobody@northlight.example');
	await expect(page.locator('input[name=password]')).toHaveValue('');
});

test('text in a number, or one past all bounds, is refused beside its cell and kept there', async ({
	browser
}) => {
	const page = await pageOf(browser, 'tester');
	await page.goto('/bench/campaigns/aldermoor-1650-firmware-2-20');
	const cell = page.getByLabel(/^Reading \d+, in /).last();
	for (const typed of ['fast', '1e400', 'NaN', 'Infinity', '12 W']) {
		await cell.fill(typed);
		await cell.press('Enter');
		await expect(cell).toHaveAccessibleDescription(/number|figures|unit|large/i);
		await expect(cell).toHaveValue(typed);
	}
	await page.reload();
	await expect(page.getByRole('main')).not.toContainText('NaN');
	await page.context().close();
});

test('a script typed into a text field is text everywhere it is shown', async ({ browser }) => {
	const liaison = await pageOf(browser, 'liaison');
	await liaison.goto('/partners/new');
	await liaison.getByLabel('Name').fill(`Partner ${script}`);
	await liaison.getByLabel('Notes').fill(script);
	await liaison.getByRole('button', { name: 'Add partner' }).click();
	await expect(liaison.getByRole('heading', { level: 1 })).toContainText('<script>');
	await liaison.goto('/partners');
	await expect(liaison.getByRole('link', { name: /<script>/ })).toBeVisible();
	expect(await liaison.title()).not.toBe('executed');
	await liaison.context().close();

	const writer = await pageOf(browser, 'writer');
	await writer.goto('/desk/articles/automatic-boost-and-nothing-else');
	await writer.locator('.cm-content').click();
	await writer.keyboard.press('ControlOrMeta+End');
	await writer.keyboard.insertText(`\n\n${script}\n\n:reading{workload=tile-rendr profile=stock}\n`);
	// A directive that finds nothing says so in its place, with the nearest name.
	await expect(
		writer
			.locator('.directive-error')
			.getByText(/tile-render/)
			.first()
	).toBeVisible();
	await expect(writer.locator('article').getByText(script).first()).toBeVisible();
	expect(await writer.title()).not.toBe('executed');
	await writer.context().close();
});

test('two people who save at once lose nothing: the second is shown the difference', async ({ browser }) => {
	const [one, two] = [await pageOf(browser, 'writer'), await pageOf(browser, 'editor')];
	const path = '/desk/articles/firmware-2-20-do-the-verdicts-stand';
	await one.goto(path);
	await two.goto(path);
	const write = async (page: typeof one, words: string) => {
		await page.locator('.cm-content').click();
		await page.keyboard.press('ControlOrMeta+End');
		await page.keyboard.insertText(`\n\n${words}\n`);
	};
	await write(one, 'First words.');
	await expect(one.getByText(/Saved \d\d:\d\d.*revision/)).toBeVisible();
	await write(two, 'Second words.');
	await expect(two.getByText(/newer revision/).first()).toBeVisible();
	const conflict = two.getByRole('region', { name: 'Two of you changed this text' });
	await expect(conflict.locator('ins').filter({ hasText: 'First' }).first()).toBeVisible();
	await expect(conflict.locator('ins').filter({ hasText: 'Second' }).first()).toBeVisible();
	await expect(two.locator('.cm-content')).toContainText('Second words.');
	await Promise.all([one.context().close(), two.context().close()]);
});

test('a link that is no longer good says so', async ({ page }) => {
	for (const [path, words] of [
		['/invite/not-a-real-token', 'This invitation does not work'],
		['/password/not-a-real-token', 'This link does not work']
	] as const) {
		await page.goto(path);
		await expect(page.getByRole('heading', { name: words })).toBeVisible();
		await expect(page.locator('input[type=password]')).toHaveCount(0);
	}
});

test('another site cannot make a signed-in browser change anything', async ({ page, request }) => {
	await signIn(page, 'admin');
	const cookies = (await page.context().cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
	const answer = await request.post('/sign-out', {
		headers: { cookie: cookies, origin: 'https://elsewhere.example' },
		form: {}
	});
	expect(answer.status()).toBe(403);
	await page.goto('/people');
	await expect(page.getByText(address('tester'))).toBeVisible();
});

test('every answer carries the security headers, and pages a policy with a nonce', async ({ request }) => {
	for (const path of ['/', '/sign-in', '/healthz', '/api/v1/openapi.json', '/no-such-page']) {
		const headers = (await request.get(path)).headers();
		expect(headers['x-content-type-options'], path).toBe('nosniff');
		expect(headers['x-frame-options'], path).toBe('DENY');
		expect(headers['content-security-policy'], path).toBeTruthy();
	}
	const policy = (await request.get('/sign-in')).headers()['content-security-policy'] ?? '';
	expect(policy).toMatch(/script-src[^;]*'nonce-/);
	expect(policy).not.toMatch(/script-src[^;]*'unsafe-/);
});

test('without scripts a refused form shows its error beside the field and keeps what was typed', async ({
	browser
}) => {
	const post = async (
		role: 'liaison' | 'tester',
		path: string,
		typed: Record<string, string>,
		opens = ''
	) => {
		const page = await pageOf(browser, role, { javaScriptEnabled: false });
		await page.goto(path);
		if (opens) {
			await page.locator('main a[href^="/partners/loans/"]').first().click();
			await page.getByText(opens).click();
		}
		const form = page
			.locator('main form[method=post]')
			.filter({ has: page.locator(`[name=${Object.keys(typed)[0]}]`) });
		// The server is asked, not the browser's own checks.
		await form.evaluate((element: HTMLFormElement) => (element.noValidate = true));
		for (const [name, text] of Object.entries(typed)) await form.locator(`[name=${name}]`).fill(text);
		await form.getByRole('button').first().click();
		return { page, form };
	};
	const refusals = [
		{
			role: 'liaison',
			path: '/partners/new',
			typed: { contactEmail: 'no-address' },
			label: 'E-mail',
			says: /e-mail/
		},
		{
			role: 'tester',
			path: '/bench/workloads/new',
			typed: { leastDifferencePercent: 'often' },
			label: /least/i,
			says: /figures/
		},
		{
			role: 'tester',
			path: '/stores/parts/aldermoor-1650',
			typed: { amount: 'a lot', currency: 'ZZZ' },
			label: 'Price',
			says: /figures/
		}
	] as const;
	for (const { role, path, typed, label, says } of refusals) {
		const { page, form } = await post(role, path, typed);
		for (const [name, text] of Object.entries(typed))
			await expect(form.locator(`[name=${name}]`)).toHaveValue(text);
		await expect(form.getByLabel(label).first()).toHaveAccessibleDescription(says);
		await page.context().close();
	}
	const { page, form } = await post('liaison', '/partners', { until: '', zone: '' }, 'Set an embargo…');
	await expect(form.getByLabel('Time zone')).toBeVisible();
	await expect(form.getByLabel('Time zone')).toHaveAccessibleDescription(/time zone/i);
	await page.context().close();
});
