import { expect, test, type APIRequestContext, type Page } from '@playwright/test';
import { pageOf, send, signInAs } from './support';

// The entry grid as a tester uses it: by keys alone, over a line that breaks, and beside somebody else.
test.describe.configure({ mode: 'serial' });

const profiles = ['stock', 'early', 'calm', 'brisk', 'steep', 'level'];
const workloads = ['unpack', 'render', 'compile', 'encode', 'search', 'ledger', 'mesh', 'fold'];
const repeats = 5;

let page: Page;
let token = '';

/** A value of its own for each reading, a little apart from the others of its cell. */
const valueOf = (profile: number, workload: number, repeat: number): number =>
	Math.round((100 + profile * 8 + workload + ((repeat * 3) % 5) / 10) * 10) / 10;
const valuesOf = (profile: number, workload: number): number[] =>
	Array.from({ length: repeats }, (_, repeat) => valueOf(profile, workload, repeat));

async function plan(request: APIRequestContext, slug: string, rows: string[], columns: string[]) {
	await send(request, token, '/campaigns', {
		name: slug.replaceAll('-', ' '),
		slug,
		rig: 'e-1-bench',
		profiles: rows,
		workloads: columns.map((workload) => ({ workload }))
	});
	return `/bench/campaigns/${slug}`;
}

interface Cell {
	profile: string;
	workload: string;
	n: number;
	mean: number;
	min: number;
	max: number;
	sd: number;
}
async function cellsOf(request: APIRequestContext, slug: string): Promise<Cell[]> {
	const answer = await request.get(`/api/v1/campaigns/${slug}/summary`, {
		headers: { authorization: `Bearer ${token}` }
	});
	return ((await answer.json()) as { cells: Cell[] }).cells;
}

/** Each cell holds what was typed into it, each reading once: n, mean, spread and ends are theirs. */
async function expectTyped(request: APIRequestContext, slug: string, rows: number) {
	const cells = await cellsOf(request, slug);
	expect(cells).toHaveLength(rows * workloads.length);
	for (const cell of cells) {
		const values = valuesOf(profiles.indexOf(cell.profile), workloads.indexOf(cell.workload));
		const mean = values.reduce((sum, value) => sum + value, 0) / repeats;
		const sd = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (repeats - 1));
		expect(cell, `${cell.profile}/${cell.workload}`).toMatchObject({
			n: repeats,
			min: Math.min(...values),
			max: Math.max(...values)
		});
		expect(cell.mean).toBeCloseTo(mean, 9);
		expect(cell.sd).toBeCloseTo(sd, 9);
	}
}

/** Types every reading of some profiles, cell by cell in the order the board gives, never waiting for the server. */
async function typeAll(rows: number, beforeEach: () => Promise<void> = () => Promise.resolve()) {
	for (let profile = 0; profile < rows; profile++)
		for (let workload = 0; workload < workloads.length; workload++) {
			for (const value of valuesOf(profile, workload)) {
				await beforeEach();
				await page.keyboard.type(String(value));
				await page.keyboard.press('Enter');
			}
			await page.keyboard.press('Enter');
		}
}

test.beforeAll(async ({ browser, request }) => {
	page = await pageOf(browser, 'tester');
	await page.goto('/me');
	await page.getByLabel('Name').last().fill('entry');
	for (const scope of ['bench:read', 'bench:write', 'stores:read', 'stores:write'])
		await page.locator(`input[value="${scope}"]`).check();
	await page.getByRole('button', { name: 'Make the token' }).click();
	token =
		(
			await page
				.getByText(/^calipress_/)
				.first()
				.textContent()
		)?.trim() ?? '';
	await send(request, token, '/parts', {
		kind: 'processor',
		maker: 'Fenwick',
		model: 'Solo 1',
		slug: 'fenwick-solo-1'
	});
	await send(request, token, '/samples', { part: 'fenwick-solo-1', slug: 'e-1', provenance: 'bought' });
	await send(request, token, '/rigs', { name: 'E-1 bench', slug: 'e-1-bench', samples: ['e-1'] });
	for (const slug of profiles.slice(1))
		await send(request, token, '/profiles', { rig: 'e-1-bench', name: slug, slug, settings: [] });
	for (const slug of workloads)
		await send(request, token, '/workloads', {
			name: slug,
			slug,
			settings: '',
			quantity: 'time',
			unit: 's',
			better: 'lower',
			class: 'all-core',
			repeats,
			leastDifferencePercent: 1
		});
});
test.afterAll(() => page.context().close());

test('a campaign of 6 × 8 cells with 5 readings each is entered by keys alone', async ({ request }) => {
	await page.goto(await plan(request, 'by-keys', profiles, workloads));
	const enter = page.getByRole('link', { name: 'Enter readings' });
	await expect(page.getByLabel('Reading 1, in s')).toBeVisible();
	await enter.focus();
	await page.keyboard.press('Enter');
	await typeAll(profiles.length);
	await expect(page.getByText(/240\s*of 240 readings/)).toBeVisible({ timeout: 30_000 });
	await expectTyped(request, 'by-keys', profiles.length);
});

test('the keys of the list do what it says', async ({ request }) => {
	await page.goto(await plan(request, 'keys', profiles.slice(0, 2), workloads));
	const field = (n: number) => page.getByLabel(`Reading ${n}, in s`);
	await field(1).focus();
	await page.keyboard.press('?');
	await expect(page.getByRole('dialog')).toContainText('the neighbouring cell of the board');
	await page.keyboard.press('Escape');
	await expect(page.getByRole('dialog')).toBeHidden();

	await field(1).focus();
	await page.keyboard.type('31.2');
	await page.keyboard.press('Enter');
	await expect(field(2)).toBeFocused();
	await page.keyboard.press('Control+d');
	await expect(field(2)).toHaveValue('31.2');
	await page.keyboard.press('ArrowDown');
	await expect(field(3)).toBeFocused();
	await page.keyboard.press('ArrowUp');
	await expect(field(2)).toBeFocused();
	await field(2).fill('');

	// Far from the others: asked about, and put right from the keyboard.
	await page.keyboard.type('31250');
	await page.keyboard.press('Enter');
	await expect(
		page.getByText(/31.250 is about 1000 times the others \(31\.2\)\. Is it in ms\?/)
	).toBeVisible();
	await page.keyboard.press('Tab');
	await page.keyboard.press('Tab');
	await page.keyboard.press('Enter');
	await expect(page.getByRole('cell', { name: '31.25', exact: true })).toBeVisible();

	// Stored already: taken back by an exclusion with its reason, not by a deletion.
	await expect(page.locator('#entry').getByText('sending')).toHaveCount(0);
	await page.keyboard.press('Control+z');
	await expect(page.getByRole('dialog').getByLabel('Reason')).toHaveValue('typed wrongly');
	await page.getByRole('button', { name: 'Exclude the reading' }).click();
	await expect(page.getByText('excluded: typed wrongly')).toBeVisible();

	await field(2).focus();
	await page.keyboard.press('Alt+ArrowRight');
	await expect(page.getByRole('heading', { name: 'Stock · render' })).toBeVisible();
	await expect(field(1)).toBeFocused();
	await page.keyboard.press('Alt+ArrowDown');
	await expect(page.getByRole('heading', { name: 'early · render' })).toBeVisible();
	await expect(page).toHaveURL(/profile=early&workload=render/);
});

test('a block of several columns goes to the workloads beside it, after a look', async ({ request }) => {
	await page.goto(await plan(request, 'block', profiles.slice(0, 1), workloads));
	await page.getByLabel('Reading 1, in s').focus();
	await page.evaluate(() => {
		const data = new DataTransfer();
		data.setData('text/plain', '31,2\t12,5\n31,3\t12,6\n31,1\tslow\n');
		document.activeElement?.dispatchEvent(
			new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true })
		);
	});
	const look = page.getByRole('region', { name: 'What was pasted' });
	await expect(look.getByRole('row', { name: /unpack/ })).toContainText('31.2, 31.3, 31.1');
	await expect(look.getByRole('row', { name: /render/ })).toContainText('12.5, 12.6');
	await expect(look.getByRole('row', { name: /render/ })).toContainText('slow');
	await page.keyboard.press('Enter');
	await expect(page.getByText(/5\s*of 40 readings/)).toBeVisible();
	await page.getByLabel('Reading 4, in s').focus();
	await page.keyboard.press('Alt+ArrowRight');
	// What was no reading waits in its cell.
	await expect(page.getByLabel('Reading 3, in s')).toHaveValue('slow');
	const cells = await cellsOf(request, 'block');
	expect(cells.slice(0, 2).map(({ n, min, max }) => [n, min, max])).toEqual([
		[3, 31.1, 31.3],
		[2, 12.5, 12.6]
	]);
});

test('a line cut at fifty moments loses nothing and doubles nothing', async ({ request }) => {
	await page.goto(await plan(request, 'cut', profiles.slice(0, 3), workloads));
	await expect(page.getByLabel('Reading 1, in s')).toBeVisible();
	// A fixed seed: the same fifty moments each time (mulberry32, a public-domain generator).
	let seed = 20_261_201;
	const random = () => {
		seed = (seed + 0x6d2b79f5) | 0;
		let t = Math.imul(seed ^ (seed >>> 15), 1 | seed);
		t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
		return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
	};
	const cuts = { before: 0, after: 0, offline: 0 };
	const made = () => cuts.before + cuts.after + cuts.offline;
	await page.route('**/readings', async (route) => {
		const chance = made() < 50 ? random() : 1;
		if (chance < 0.3) {
			cuts.before += 1;
			await route.abort('connectionreset');
		} else if (chance < 0.6) {
			// The server has it; its answer never arrives.
			cuts.after += 1;
			await route.fetch().catch(() => undefined);
			await route.abort('connectionreset');
		} else await route.continue();
	});
	await page.getByRole('link', { name: 'Enter readings' }).focus();
	await page.keyboard.press('Enter');
	await typeAll(3, async () => {
		const chance = random();
		if (chance < 0.12 && made() < 50) {
			cuts.offline += 1;
			await page.context().setOffline(true);
		} else if (chance > 0.7) await page.context().setOffline(false);
	});
	await page.context().setOffline(false);
	const again = page.getByRole('button', { name: 'Try now' });
	await expect(async () => {
		if (await again.isVisible()) await again.click();
		await expect(page.getByText(/120\s*of 120 readings/)).toBeVisible({ timeout: 500 });
	}).toPass({ timeout: 40_000 });
	await page.unroute('**/readings');
	expect(made(), JSON.stringify(cuts)).toBe(50);
	await expectTyped(request, 'cut', 3);
});

test('two testers in one cell see both values, and the second chooses', async ({ browser, request }) => {
	const address = await plan(request, 'two', profiles.slice(0, 1), workloads.slice(0, 2));
	const pelle = await (await browser.newContext()).newPage();
	await signInAs(pelle, 'pelle@northlight.example');
	const here = `${address}?profile=stock&workload=unpack`;
	await page.goto(here);
	await page.getByLabel('Reading 1, in s').focus();
	for (const value of ['31.1', '31.2', '31.3', '31.4']) {
		await page.keyboard.type(value);
		await page.keyboard.press('Enter');
	}
	await expect(page.getByText(/4\s*of 10 readings/)).toBeVisible();
	// Cut off from what others enter, Pelle still sees four.
	await pelle.route('**/events**', (route) => route.abort());
	await pelle.goto(here);
	await expect(pelle.getByLabel('Reading 5, in s')).toBeVisible();
	await page.keyboard.type('31.5');
	await page.keyboard.press('Enter');
	await expect(page.getByText(/5\s*of 10 readings/)).toBeVisible();

	await pelle.getByLabel('Reading 5, in s').fill('99.5');
	await pelle.getByLabel('Reading 5, in s').press('Enter');
	const notice = pelle.getByRole('status').filter({ hasText: 'entered readings in this cell meanwhile' });
	await expect(notice).toContainText('31.5');
	await expect(notice).toContainText('99.5');
	expect((await cellsOf(request, 'two'))[0]?.n).toBe(5);
	// Kept over a reload, until it is chosen.
	await pelle.reload();
	await expect(notice).toContainText('99.5');
	await notice.getByRole('button', { name: 'Keep both' }).click();
	await expect(notice).toBeHidden();
	await expect(page.getByText('Pelle Brandvik entered 1 reading in Stock · unpack.')).toBeVisible();
	expect((await cellsOf(request, 'two'))[0]).toMatchObject({ n: 6, max: 99.5 });

	// And the other choice: mine is dropped, theirs stands alone.
	await pelle.goto(`${address}?profile=stock&workload=render`);
	await expect(pelle.getByLabel('Reading 1, in s')).toBeVisible();
	await page.goto(`${address}?profile=stock&workload=render`);
	for (const value of ['12.1', '12.2', '12.3', '12.4', '12.5']) {
		await page
			.getByLabel(/^Reading \d, in s/)
			.first()
			.fill(value);
		await page
			.getByLabel(/^Reading \d, in s/)
			.first()
			.press('Enter');
	}
	await expect(page.locator('#entry').getByText('sending')).toHaveCount(0);
	await pelle.getByLabel('Reading 1, in s').fill('12.6');
	await pelle.getByLabel('Reading 1, in s').press('Enter');
	await expect(notice).toContainText('12.6');
	await notice.getByRole('button', { name: 'Drop mine' }).click();
	await expect(notice).toBeHidden();
	expect((await cellsOf(request, 'two'))[1]).toMatchObject({ n: 5, max: 12.5 });
	await pelle.context().close();
});

test('several cells are chosen and signed by keys, and a filter hides what is done', async () => {
	await page.goto('/bench/campaigns/by-keys?choose=1');
	const box = (name: string) => page.getByRole('checkbox', { name: `Choose ${name}` });
	await box('Stock · unpack').focus();
	await page.keyboard.press('Space');
	await page.keyboard.press('Shift+ArrowRight');
	await page.keyboard.press('Shift+ArrowDown');
	await expect(page.getByText('4 cells chosen.')).toBeVisible();
	await page.getByRole('button', { name: 'Sign the complete ones' }).click();
	await expect(page.getByText('4 cells signed.')).toBeVisible();

	await page.goto('/bench/campaigns/by-keys');
	await page.getByLabel('Cells', { exact: true }).selectOption('unsigned');
	await expect(page.getByText('44 of 48 cells')).toBeVisible();
	await page.goto('/bench/campaigns/by-keys?show=unfinished');
	await expect(page.getByText('No cell is like that.')).toBeVisible();
});

test('cells are chosen, signed and freed without scripts as well', async ({ browser }) => {
	const context = await browser.newContext({
		javaScriptEnabled: false,
		storageState: await page.context().storageState()
	});
	const plain = await context.newPage();
	await plain.goto('/bench/campaigns/by-keys?choose=1');
	await plain.getByRole('checkbox', { name: 'Choose Stock · unpack' }).check();
	await plain.getByRole('checkbox', { name: 'Choose level · fold' }).check();
	await plain.getByLabel('Reason').fill('the room was warm');
	await plain.getByRole('button', { name: 'Take their signatures off' }).click();
	await expect(plain.getByText('One signature was taken off; 1 of the chosen cells had none.')).toBeVisible();
	await context.close();
});
