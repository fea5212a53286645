import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { signIn, type Role } from './support';

// The screens change nothing: both workers share them.
test.describe.configure({ mode: 'parallel' });

// WCAG 2.2 level A and AA by axe's rules, in light at 1440 px and in dark at 390 px; nothing wider than a phone.
const rules = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** What passes is not gathered, and no page is opened to gather it on: both took as long as the checks. There are no frames. */
const sparing = { resultTypes: ['violations' as const], preload: false };

const screens: Record<'visitor' | Role, string[]> = {
	visitor: [
		'/',
		'/articles/aldermoor-1650-four-ways-to-spend-sixteen-cores',
		'/articles/what-idle-costs',
		'/articles/pennon-6000-tested-one-line-in-a-menu',
		'/parts',
		'/parts/aldermoor-1650',
		'/methods',
		'/methods/tile-render',
		'/how-we-test',
		'/about',
		'/corrections',
		'/sign-in',
		'/no-such-page'
	],
	tester: [
		'/bench',
		'/bench/campaigns/new',
		'/bench/campaigns/aldermoor-1650-firmware-2-20',
		'/bench/campaigns/aldermoor-1650-firmware-2-20/compare',
		'/bench/campaigns/aldermoor-1650-firmware-2-20/import',
		'/bench/campaigns/aldermoor-1650-firmware-2-20/history',
		'/bench/workloads',
		'/bench/workloads/tile-render',
		'/bench/workloads/new',
		'/bench/rigs',
		'/bench/rigs/n-12',
		'/bench/rigs/new',
		'/stores',
		'/stores/parts/aldermoor-1650',
		'/stores/parts/new',
		'/stores/samples',
		'/me'
	],
	writer: [
		'/desk',
		'/desk/new',
		'/desk/glossary',
		'/desk/glossary/new',
		'/desk/glossary/sone/edit',
		'/desk/articles',
		'/desk/articles/automatic-boost-and-nothing-else/narration',
		'/desk/articles/automatic-boost-and-nothing-else/narration/prompter',
		'/desk/new/import',
		'/desk/articles/automatic-boost-and-nothing-else/import',
		'/desk/articles/automatic-boost-and-nothing-else',
		'/desk/articles/automatic-boost-and-nothing-else/revisions'
	],
	editor: [
		'/desk',
		'/desk/templates',
		'/desk/templates/new',
		'/desk/templates/tuning-guide',
		'/desk/templates/tuning-guide/edit',
		'/desk/articles/marlow-g70-at-three-power-limits/review',
		'/desk/articles/memory-by-hand-what-an-evening-brings/review',
		'/desk/articles/aldermoor-1650-four-ways-to-spend-sixteen-cores/review'
	],
	liaison: [
		'/partners',
		'/partners/aldermoor',
		'/partners/aldermoor/ask',
		'/partners/loans/1',
		'/partners/new'
	],
	admin: ['/people', '/people/invite', '/people/audit', '/people/jobs', '/people/settings']
};

/** What the browser itself complains of: errors of scripts, and of the content policy. */
function complaints(page: Page): string[] {
	const heard: string[] = [];
	page.on('pageerror', (error) => heard.push(String(error)));
	page.on('console', (message) => {
		// A page that is not there is an answer, not a fault of the page.
		if (message.type() === 'error' && !/status of 404/.test(message.text())) heard.push(message.text());
	});
	return heard;
}

for (const [who, paths] of Object.entries(screens)) {
	for (const [look, width] of [
		['light', 1440],
		['dark', 390]
	] as const) {
		test(`the screens of the ${who} in ${look} at ${width} px can be read by everybody and stay inside`, async ({
			browser
		}) => {
			test.setTimeout(240_000);
			const context = await browser.newContext({
				colorScheme: look,
				viewport: { width, height: 900 },
				reducedMotion: 'reduce'
			});
			const page = await context.newPage();
			const heard = complaints(page);
			if (who !== 'visitor') await signIn(page, who as Role);
			for (const path of paths) {
				await page.goto(path);
				await expect(page.locator('h1').first()).toBeAttached();
				const { violations } = await new AxeBuilder({ page })
					.setLegacyMode(true)
					.options(sparing)
					.withTags(rules)
					.analyze();
				const found = violations.map(
					({ id, nodes }) => `${id}: ${nodes.map((node) => node.target.join(' ')).join(', ')}`
				);
				expect.soft(found, `${path} in ${look} at ${width}`).toEqual([]);
				const wider = await page.evaluate(
					() => document.documentElement.scrollWidth - document.documentElement.clientWidth
				);
				expect.soft(wider, `${path} is ${wider} px wider than the window`).toBeLessThanOrEqual(0);
			}
			expect.soft(heard).toEqual([]);
			await context.close();
		});
	}
}
