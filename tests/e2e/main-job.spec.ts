import { expect, test, type Page } from '@playwright/test';
import { address, linkIn, mailTo, pageOf, send, type Role } from './support';
import { cellByR, header, measured, overallByR, ratioByR, readPrinted } from './reference';

// One measured campaign from an empty plan to a printed page: four people, nothing retyped.
test.describe.configure({ mode: 'serial' });

const title = 'Two cores, four ways';
const slug = 'two-cores-four-ways';
const profiles = ['stock', 'single-core', 'no-vector-crypto', 'huge-pages'] as const;
const workloads = [...new Map(measured.map((row) => [row.workload, row])).values()];
const name = (word: string) => word.charAt(0).toUpperCase() + word.slice(1).replaceAll('-', ' ');
const people = {} as Record<Role, Page>;
let token = '';

const source = `## What one core costs

Held to one core, the prime search makes :reading{workload=vm-prime-search profile=single-core} where stock makes :reading{workload=vm-prime-search profile=stock}: :gain{workload=vm-prime-search profile=single-core}. The source build goes the other way, :gain{workload=vm-source-build profile=single-core}.

Without its cipher instructions the processor encrypts :reading{workload=vm-aes-gcm-16k profile=no-vector-crypto}. Over all workloads that is :overall{profile=no-vector-crypto}.

::plate{kind=scores workload=vm-aes-gcm-16k}

::plate{kind=gains over=stock}

::results

## What we tested

::kit

::steps{profile=huge-pages}

::caution{topic=data}
`;

test.beforeAll(async ({ browser }) => {
	for (const role of ['tester', 'writer', 'editor', 'liaison'] as const)
		people[role] = await pageOf(browser, role);
});
test.afterAll(async () => {
	await Promise.all(Object.values(people).map((page) => page.context().close()));
});

test('the tester makes a token, and a script plans the campaign and sends half of the runs', async ({
	request
}) => {
	const page = people.tester;
	await page.goto('/me');
	await page.getByLabel('Name').last().fill('bench script');
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
	expect(token).toMatch(/^calipress_\S{20,}$/);

	await send(request, token, '/parts', {
		kind: 'processor',
		maker: 'Fenwick',
		model: 'Duet 2',
		slug: 'fenwick-duet-2',
		specification: [{ name: 'Cores', value: '2' }],
		prices: [{ amount: '119.90', currency: 'EUR', observedOn: '2026-11-02' }]
	});
	await send(request, token, '/samples', { part: 'fenwick-duet-2', slug: 'f-1', provenance: 'loaned' });
	await send(request, token, '/rigs', {
		name: 'F-1 bench',
		slug: 'f-1-bench',
		samples: ['f-1'],
		firmware: '1.02',
		os: 'Debian 12'
	});
	for (const profile of profiles.slice(1))
		await send(request, token, '/profiles', {
			rig: 'f-1-bench',
			name: name(profile),
			slug: profile,
			settings: [{ menuPath: 'Start > Launch', setting: 'Variant', value: profile }]
		});
	for (const row of workloads) {
		await send(request, token, '/workloads', {
			name: name(row.workload),
			slug: row.workload,
			settings: 'As in tests/fixtures.',
			quantity: row.better === 'lower' ? 'time' : 'throughput',
			unit: row.unit,
			better: row.better,
			class: row.class,
			repeats: 7,
			leastDifferencePercent: 1
		});
	}
	await send(request, token, '/campaigns', {
		name: 'Duet 2, four ways',
		slug: 'duet-2-four-ways',
		rig: 'f-1-bench',
		profiles: [...profiles],
		workloads: workloads.map((row) => ({ workload: row.workload }))
	});
	for (const profile of profiles.slice(0, 2)) {
		for (const { workload, unit } of workloads) {
			const rows = measured.filter((row) => row.profile === profile && row.workload === workload);
			await send(request, token, '/campaigns/duet-2-four-ways/runs', {
				profile,
				workload,
				unit,
				readings: rows.map((row) => row.value),
				ambientC: 22.5,
				startedAt: rows[0]?.startedAt
			});
		}
	}
});

test('the other half comes as a CSV file through the browser, and what is wrong in it is refused', async () => {
	const page = people.tester;
	const lines = measured
		.filter((row) => row.profile === 'no-vector-crypto' || row.profile === 'huge-pages')
		.map((row) => row.line);
	const file = (rows: string[]) => ({
		name: 'readings.csv',
		mimeType: 'text/csv',
		buffer: Buffer.from([header, ...rows].join('\r\n'))
	});
	await page.goto('/bench/campaigns/duet-2-four-ways/import');
	await page.setInputFiles(
		'input[type=file]',
		file([
			...lines.slice(0, 3),
			'huge-pages,vm-prime-search,events/s,higher,all-core,9,fast,',
			'huge-page,vm-prime-search,events/s,higher,all-core,9,4800,'
		])
	);
	await page.getByRole('button', { name: 'Preview' }).click();
	await expect(page.getByText('huge-pages').last()).toBeVisible();
	await expect(page.getByText(/not a number|figures/i).first()).toBeVisible();
	await page.goto('/bench/campaigns/duet-2-four-ways/import');
	await page.setInputFiles('input[type=file]', file(lines));
	await page.getByRole('button', { name: 'Preview' }).click();
	await page.getByRole('button', { name: /98/ }).click();
	await page.waitForURL(/\/bench\/campaigns\/duet-2-four-ways\?/);
	await expect(
		page
			.getByText('196 of 196 readings')
			.or(page.getByText(/^\s*196\s*of 196/))
			.first()
	).toBeVisible();
});

test('the summary over the API is what R says', async ({ request }) => {
	const answer = await request.get('/api/v1/campaigns/duet-2-four-ways/summary?baseline=stock', {
		headers: { authorization: `Bearer ${token}` }
	});
	const summary = (await answer.json()) as {
		cells: {
			profile: string;
			workload: string;
			n: number;
			mean: number;
			sd: number;
			ci95: [number, number];
			ratio?: number | null;
			baseline?: { ratio: number } | null;
		}[];
	};
	expect(summary.cells).toHaveLength(28);
	for (const cell of summary.cells) {
		const r = cellByR(cell.profile, cell.workload);
		expect(cell.n).toBe(r.n);
		for (const [ours, theirs] of [
			[cell.mean, r.mean],
			[cell.sd, r.sd],
			[cell.ci95[0], r.low],
			[cell.ci95[1], r.high]
		])
			expect(Math.abs((ours ?? NaN) / (theirs ?? NaN) - 1)).toBeLessThan(1e-9);
	}
});

test('the tester signs the data off', async () => {
	const page = people.tester;
	await page.goto('/bench/campaigns/duet-2-four-ways');
	await page.getByRole('button', { name: /^Sign all 28/ }).click();
	await expect(page.getByText('28 of 28 cells signed')).toBeVisible();
});

test('the liaison writes the loan down, with its disclosure and an embargo', async () => {
	const page = people.liaison;
	await page.goto('/partners/new');
	await page.getByLabel('Name').fill('Fenwick Lending Desk');
	await page.getByRole('button', { name: 'Add partner' }).click();
	await page.getByRole('link', { name: 'Ask for a loan' }).click();
	await page.locator('input[value="f-1"]').check();
	await page
		.getByLabel('Disclosure')
		.fill('The processor was lent by its maker, who saw nothing of this article before it was printed.');
	await page.getByRole('button', { name: 'Open the loan' }).click();
	await page.getByLabel('What happened').selectOption({ label: 'It is here' });
	await page.getByRole('button', { name: 'Write it down' }).click();
	await expect(page.getByText('here since')).toBeVisible();
	await page.getByText('Set an embargo…').click();
	await page.getByLabel('Until').fill('2099-01-01T12:00');
	await page.getByRole('button', { name: 'Set the embargo' }).click();
	await expect(page.locator('p', { hasText: /Fenwick\s+Duet 2, until/ })).toBeVisible();
});

test('the writer starts from a template, writes, and submits', async ({ request }) => {
	const page = people.writer;
	await page.goto('/desk/new');
	await page.getByLabel('Title').fill(title);
	await page.locator('input[name=template][value="tuning-guide"]').check();
	await page.getByLabel(/Duet 2, four ways/).check();
	await page.getByRole('button', { name: 'Start the article' }).click();
	await page.waitForURL(`**/desk/articles/${slug}`);
	await page
		.getByLabel('Standfirst')
		.fill('What one core, no ciphers and large pages do to a small machine.');
	const editor = page.locator('.cm-content');
	await editor.click();
	await page.keyboard.press('ControlOrMeta+a');
	await page.keyboard.insertText(source);
	await expect(page.getByText(/Saved \d\d:\d\d.*revision/)).toBeVisible();
	await expect(page.locator('.plate svg:visible').first()).toBeVisible();
	await page.getByRole('button', { name: 'Submit for review' }).click();
	const mail = await mailTo(request, address('editor'), new RegExp(title));
	expect(linkIn(mail)).toContain(`/desk/articles/${slug}`);
});

test('the editor is held back by the preflight, comments, and asks for changes', async ({ request }) => {
	const page = people.editor;
	await page.goto(`/desk/articles/${slug}/review`);
	// A lent sample without its disclosure on the page.
	await expect(page.getByText(/disclosure/i).first()).toBeVisible();
	await page.locator('#comment-form textarea[name=body]').fill('Say where the processor comes from.');
	await page.getByLabel('It holds the article back').check();
	await page.getByRole('button', { name: 'Comment', exact: true }).click();
	await expect(page.getByText('Say where the processor comes from.').first()).toBeVisible();
	await page.getByText('Ask for changes', { exact: true }).first().click();
	await page.getByLabel('What should change').fill('The disclosure is missing.');
	await page.getByRole('button', { name: 'Ask for changes' }).click();
	const mail = await mailTo(request, address('writer'), /The disclosure is missing\./);
	expect(linkIn(mail)).toContain(`/desk/articles/${slug}`);
});

test('the writer mends it and submits again', async () => {
	const page = people.writer;
	await page.goto(`/desk/articles/${slug}`);
	await page.locator('.cm-content').click();
	await page.keyboard.press('ControlOrMeta+End');
	await page.keyboard.insertText('\n::disclosure\n');
	await expect(page.getByText(/Saved \d\d:\d\d.*revision/)).toBeVisible();
	await expect(page.getByText('The processor was lent by its maker').first()).toBeVisible();
	await page.goto(`/desk/articles/${slug}/review`);
	await page
		.getByRole('button', { name: /Resolve/ })
		.first()
		.click();
	await page.getByRole('button', { name: 'Submit again' }).click();
	await expect(page.getByText('in review').first()).toBeVisible();
	// Nobody approves an article of their own, and a writer approves none.
	await expect(page.getByRole('button', { name: 'Approve and freeze' })).toHaveCount(0);
});

test('the embargo holds the page back until the liaison lifts it, with a reason', async () => {
	const page = people.editor;
	await page.goto(`/desk/articles/${slug}/review`);
	await page.getByRole('button', { name: 'Approve and freeze' }).click();
	await expect(page.getByText('approved').first()).toBeVisible();
	await page.getByText('Publish now').first().click();
	await page.getByRole('button', { name: 'Publish now' }).click();
	await expect(
		page
			.getByRole('alert')
			.filter({ hasText: /embargo/i })
			.first()
	).toBeVisible();
	expect((await page.request.get(`/articles/${slug}`)).status()).toBe(404);

	const desk = people.liaison;
	await desk.goto('/partners/fenwick-lending-desk');
	await desk.getByRole('link', { name: 'Fenwick Duet 2' }).click();
	await expect(desk.getByRole('row', { name: new RegExp(title) })).toBeVisible();
	expect((await desk.request.get(`/desk/articles/${slug}`)).status()).toBe(403);
	await desk.getByText('Lift it early…').click();
	await desk.getByLabel('Reason').fill('Announced today.');
	await desk.getByRole('button', { name: 'Lift this embargo' }).click();
	await expect(desk.getByText(/Lifted .*Announced today\./)).toBeVisible();
});

test('it is published, and those concerned are told', async ({ request }) => {
	const page = people.editor;
	await page.goto(`/desk/articles/${slug}/review`);
	await page.getByText('Publish now').first().click();
	await page.getByRole('button', { name: 'Publish now' }).click();
	await expect(page.getByText('published').first()).toBeVisible();
	await mailTo(
		request,
		address('writer'),
		new RegExp(`(published|out)[\\s\\S]*${title}|${title}[\\s\\S]*(published|out)`, 'i')
	);
	const liaisonMail = await mailTo(request, address('liaison'), new RegExp(title));
	// The wall: the liaison is told that it is out and where, not what it says.
	expect(liaisonMail.text).not.toContain('What one core costs');
	const feed = await (await request.get('/feed.atom')).text();
	expect(feed).toContain(`<title>${title}</title>`);
});

test('each figure on the printed page is R’s, at the printed rounding, also without scripts', async ({
	browser
}) => {
	const context = await browser.newContext({ javaScriptEnabled: false });
	const page = await context.newPage();
	await page.goto(`/articles/${slug}`);
	const near = (printed: string, theirs: number) => {
		const { value, halfStep } = readPrinted(printed);
		expect(Math.abs(value - theirs), `${printed} against ${theirs}`).toBeLessThanOrEqual(
			halfStep * (1 + 1e-9)
		);
	};
	const readings = page.locator('.reading');
	near(await readings.nth(0).innerText(), cellByR('single-core', 'vm-prime-search').mean ?? NaN);
	near(await readings.nth(1).innerText(), cellByR('stock', 'vm-prime-search').mean ?? NaN);
	near(await readings.nth(2).innerText(), cellByR('no-vector-crypto', 'vm-aes-gcm-16k').mean ?? NaN);
	const signed = (printed: string, ratio: number) => {
		const { value, halfStep } = readPrinted(printed);
		expect(
			Math.abs(Math.abs(value) - Math.abs((ratio - 1) * 100)),
			`${printed} against ${ratio}`
		).toBeLessThanOrEqual(halfStep * (1 + 1e-9));
	};
	signed(await page.locator('.gain').nth(0).innerText(), ratioByR('single-core', 'vm-prime-search'));
	signed(await page.locator('.gain').nth(1).innerText(), ratioByR('single-core', 'vm-source-build'));
	signed(await page.locator('.overall').first().innerText(), overallByR('no-vector-crypto'));
	await expect(page.locator('.plate svg:visible')).toHaveCount(2);
	await expect(page.getByText('The processor was lent by its maker').first()).toBeVisible();
	for (const kind of ['svg', 'csv']) {
		const href = await page.locator(`.plate a[href$=".${kind}"]`).first().getAttribute('href');
		const file = await page.request.get(new URL(href ?? '', page.url()).href);
		expect(file.status()).toBe(200);
	}
	await page.goto('/parts/fenwick-duet-2');
	await expect(page.getByRole('link', { name: title }).first()).toBeVisible();
	await page.goto('/methods/vm-aes-gcm-16k');
	await expect(page.getByRole('link', { name: title }).first()).toBeVisible();
	await context.close();
});

test('what changes on the bench afterwards does not change the page', async ({ request }) => {
	const before = await (await request.get(`/articles/${slug}`)).text();
	const rows = measured.filter((row) => row.profile === 'stock' && row.workload === 'vm-prime-search');
	await send(request, token, '/campaigns/duet-2-four-ways/runs', {
		profile: 'stock',
		workload: 'vm-prime-search',
		unit: 'events/s',
		readings: rows.map((row) => row.value * 2)
	});
	const printed = (html: string) => html.match(/<span class="reading"[\s\S]*?<\/span>/g);
	expect(printed(await (await request.get(`/articles/${slug}`)).text())).toEqual(printed(before));
});
