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

export default defineConfig({
	testDir: 'tests/e2e',
	fullyParallel: false,
	workers: 1,
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
