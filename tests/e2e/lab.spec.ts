import { readFile } from 'node:fs/promises';
import { expect, test, type Locator, type Page } from '@playwright/test';
import jsQR from 'jsqr';
import { pageOf } from './support';

let page: Page;
test.beforeAll(async ({ browser }) => {
	page = await pageOf(browser, 'tester');
});
test.afterAll(() => page.context().close());

const source = 'brisk-tower-14-second-fan';

/** What the comparison prints, cell by cell. */
const figures = async (campaign: string) => {
	await page.goto(`/bench/campaigns/${campaign}/compare`);
	return page.locator('main table').first().locator('tbody td').allInnerTexts();
};

test('a campaign is copied, its readings are exported and taken back, and the figures are the same', async () => {
	await page.goto(`/bench/campaigns/${source}/plan`);
	await page.getByRole('link', { name: 'Copy the plan' }).click();
	await expect(page.getByText('Its readings are not copied.')).toBeVisible();
	await page.locator('form[method=post] input[name=name]').fill('Second fan, taken back');
	await page.getByRole('button', { name: 'Plan it' }).click();
	await page.waitForURL('**/bench/campaigns/second-fan-taken-back');

	await page.goto(`/bench/campaigns/${source}`);
	const download = page.waitForEvent('download');
	await page.getByRole('link', { name: 'Export' }).click();
	const file = await (await download).path();
	expect((await readFile(file, 'utf8')).split('\r\n')[0]).toContain('profile,workload,run,repeat,value,unit');

	await page.goto('/bench/campaigns/second-fan-taken-back/import');
	await page.locator('input[type=file]').setInputFiles({
		name: 'readings.csv',
		mimeType: 'text/csv',
		buffer: await readFile(file)
	});
	await page.getByRole('button', { name: 'Preview' }).click();
	await page.getByRole('button', { name: /^Take all/ }).click();
	await page.waitForURL('**/bench/campaigns/second-fan-taken-back?imported=**');

	const before = await figures(source);
	expect(before.length).toBeGreaterThan(0);
	expect(await figures('second-fan-taken-back')).toEqual(before);
});

test('a suite ticks its workloads in a new plan', async () => {
	await page.goto('/bench/suites');
	await page
		.getByRole('link', { name: /^Plan a campaign/ })
		.first()
		.click();
	await page.getByLabel('Rig').selectOption('n-12');
	await expect(page.getByText('It begins with the suite')).toBeVisible();
	await expect(page.getByRole('checkbox', { name: 'Tile render' })).toBeChecked();
	await expect(page.getByRole('checkbox', { name: 'Heat soak' })).not.toBeChecked();
	await expect(page.getByLabel('Readings for Source build')).toHaveValue('5');
});

/** What another program reads in a code as it stands on the screen. */
async function read(code: Locator): Promise<string | undefined> {
	const png = (await code.screenshot()).toString('base64');
	const { data, width, height } = await page.evaluate(async (image) => {
		const picture = new Image();
		picture.src = `data:image/png;base64,${image}`;
		await picture.decode();
		const canvas = document.createElement('canvas');
		[canvas.width, canvas.height] = [picture.width, picture.height];
		const pen = canvas.getContext('2d');
		pen?.drawImage(picture, 0, 0);
		const pixels = pen?.getImageData(0, 0, canvas.width, canvas.height);
		return { data: [...(pixels?.data ?? [])], width: canvas.width, height: canvas.height };
	}, png);
	return jsQR(new Uint8ClampedArray(data), width, height)?.data;
}

test('a label’s code leads to its sample, and prints on one page of its size', async () => {
	await page.goto('/stores/samples/n-101');
	await page.getByRole('link', { name: 'Label' }).click();
	const code = page.getByRole('img', { name: /^Code that leads to/ });
	const address = await read(code);
	expect(address).toBe(new URL('/stores/samples/n-101', page.url()).href);
	const pdf = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
	expect(pdf.match(/\/Type\s*\/Page\b/g)).toHaveLength(1);
	// 62 × 29 mm in points of 1/72 inch: 175.7 × 82.2.
	const [, width, height] = /\/MediaBox\s*\[0 0 ([\d.]+) ([\d.]+)\]/.exec(pdf) ?? [];
	expect(Number(width)).toBeCloseTo((62 / 25.4) * 72, -1);
	expect(Number(height)).toBeCloseTo((29 / 25.4) * 72, -1);
});

test('a typed code opens the sample; one that is nowhere says so and stays', async () => {
	await page.goto('/stores/scan');
	await page.getByLabel('Code or serial number').fill('am16-004417');
	await page.getByRole('button', { name: 'Find', exact: true }).click();
	await page.waitForURL('**/stores/samples/n-101');
	await page.goto('/stores/scan');
	await page.getByLabel('Code or serial number').fill('no-such-code');
	await page.getByRole('button', { name: 'Find', exact: true }).click();
	await expect(page.getByText('No sample has the code or serial number “no-such-code”.')).toBeVisible();
	await expect(page.getByLabel('Code or serial number')).toHaveValue('no-such-code');
});

test('the camera reads a label, and is off afterwards; without one it says why', async () => {
	await page.goto('/stores/scan');
	await page.getByRole('button', { name: 'Scan with the camera' }).click();
	await expect(page.getByText(/Type the code|type the code/)).toBeVisible();

	await page.goto('/stores/samples/n-102/label');
	const code = page.getByRole('img', { name: /^Code that leads to/ });
	const [path, side] = await code.evaluate((svg) => [
		svg.querySelector('path')?.getAttribute('d') ?? '',
		(svg as SVGSVGElement).viewBox.baseVal.width
	]);
	await page.goto('/stores/scan');
	// A picture of the label in place of what a camera would see.
	await page.evaluate(
		([drawn, width]) => {
			const canvas = document.createElement('canvas');
			[canvas.width, canvas.height] = [640, 480];
			const pen = canvas.getContext('2d');
			if (!pen) throw new Error('no canvas');
			const paint = () => {
				pen.setTransform(1, 0, 0, 1, 0, 0);
				pen.fillStyle = '#fff';
				pen.fillRect(0, 0, 640, 480);
				pen.translate(140, 60);
				pen.scale(360 / Number(width), 360 / Number(width));
				pen.fillStyle = '#000';
				pen.fill(new Path2D(String(drawn)));
				requestAnimationFrame(paint);
			};
			paint();
			const stream = canvas.captureStream(20);
			Object.assign(window, { seen: stream });
			navigator.mediaDevices.getUserMedia = () => Promise.resolve(stream);
		},
		[path, side] as const
	);
	await page.getByRole('button', { name: 'Scan with the camera' }).click();
	await page.waitForURL('**/stores/samples/n-102');
	const states = await page.evaluate(() =>
		(window as unknown as { seen: MediaStream }).seen.getTracks().map((track) => track.readyState)
	);
	expect(states).toEqual(['ended']);
});
