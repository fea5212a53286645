import { defineConfig } from '@playwright/test';

// Debian's Chromium; the flags keep it from calling out on a closed network.
const args = [
	'--no-sandbox',
	'--disable-gpu',
	'--disable-quic',
	'--no-first-run',
	'--disable-background-networking',
	'--disable-component-update',
	'--disable-sync'
];

// Each worker reads this file and takes the environment of its house (scripts/e2e.mjs).
const houses = JSON.parse(process.env.E2E_HOUSES ?? '[{}]') as NodeJS.ProcessEnv[];
Object.assign(process.env, houses[Number(process.env.TEST_PARALLEL_INDEX ?? 0)]);

export default defineConfig({
	testDir: 'tests/e2e',
	fullyParallel: false,
	workers: houses.length,
	retries: 0,
	forbidOnly: true,
	timeout: 90_000,
	expect: { timeout: 10_000 },
	reporter: [['line'], ['json', { outputFile: 'test-results/e2e.json' }]],
	use: {
		baseURL: process.env.BASE_URL,
		viewport: { width: 1440, height: 1000 },
		launchOptions: { executablePath: process.env.CHROMIUM || '/usr/bin/chromium', args },
		screenshot: 'only-on-failure',
		trace: 'off'
	}
});
