import tailwindcss from '@tailwindcss/vite';
import { sveltekit } from '@sveltejs/kit/vite';
import { defineConfig } from 'vitest/config';

export default defineConfig({
	plugins: [tailwindcss(), sveltekit()],
	test: {
		projects: [
			{
				extends: true,
				test: {
					name: 'unit',
					include: ['src/**/*.test.ts', 'tests/architecture/**/*.test.ts'],
					environment: 'node',
					// Pure code keeps no state that a file could leave to the next; loading it anew for each took minutes.
					isolate: false
				}
			},
			{
				extends: true,
				test: {
					name: 'integration',
					include: ['tests/integration/**/*.test.ts'],
					environment: 'node',
					globalSetup: ['tests/support/global-setup.ts'],
					fileParallelism: false,
					// The application is loaded once; each file has a database of its own all the same.
					isolate: false,
					testTimeout: 30_000,
					hookTimeout: 60_000
				}
			}
		]
	}
});
