import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import ts from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

/**
 * What a layer must not import, said in the editor; dependency-cruiser checks the same by what an import resolves to.
 * @param {string[]} files
 * @param {{ group: string[], message: string }[]} patterns
 */
const layer = (files, patterns) => ({
	files,
	ignores: ['**/*.test.ts'],
	rules: { 'no-restricted-imports': ['error', { patterns }] }
});

const framework = {
	group: [
		'svelte',
		'svelte/*',
		'@sveltejs/*',
		'$app/*',
		'$env/*',
		'sveltekit-superforms',
		'sveltekit-superforms/*'
	],
	message: 'This layer knows no framework.'
};
const database = {
	group: [
		'drizzle-orm',
		'drizzle-orm/*',
		'mysql2',
		'mysql2/*',
		'**/server/db/client',
		'**/server/db/schema',
		'**/server/db/schema/*'
	],
	message: 'Ask a service, which asks a query.'
};
const server = {
	group: ['$lib/server/*', '**/lib/server/**'],
	message: 'What the browser loads cannot know the server.'
};
const routes = { group: ['**/routes/**'], message: 'Nothing imports a route.' };
const charts = {
	group: ['layerchart', 'layerchart/*'],
	message: 'Charts are drawn in components/plates alone.'
};
const authjs = {
	group: ['@auth/*'],
	message: 'Auth.js stays inside lib/server/auth; the rest sees locals.actor.'
};

export default ts.config(
	{ ignores: ['.svelte-kit/', 'build/', 'data/', 'node_modules/', 'test-results/', 'static/'] },
	js.configs.recommended,
	...ts.configs.recommended,
	...svelte.configs.recommended,
	{
		languageOptions: { globals: { ...globals.browser, ...globals.node } },
		rules: {
			// TypeScript knows what is defined.
			'no-undef': 'off',
			'no-console': 'error',
			'@typescript-eslint/no-explicit-any': 'error',
			'@typescript-eslint/no-non-null-assertion': 'error',
			'@typescript-eslint/consistent-type-imports': [
				'error',
				{ fixStyle: 'inline-type-imports', disallowTypeAnnotations: false }
			],
			'@typescript-eslint/no-unused-vars': [
				'error',
				{ argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrors: 'none' }
			],
			'svelte/no-navigation-without-resolve': 'off',
			'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }]
		}
	},
	{
		files: ['src/**/*.ts', 'tests/**/*.ts'],
		languageOptions: {
			parserOptions: {
				projectService: true,
				tsconfigRootDir: import.meta.dirname
			}
		},
		rules: {
			'@typescript-eslint/no-floating-promises': 'error',
			'@typescript-eslint/no-misused-promises': 'error',
			'@typescript-eslint/await-thenable': 'error'
		}
	},
	// Svelte's files are linted without their types, which svelte-check looks at: that takes minutes off each run.
	{
		files: ['**/*.svelte', '**/*.svelte.ts'],
		languageOptions: {
			parserOptions: {
				parser: ts.parser,
				svelteConfig
			}
		}
	},
	{
		files: ['scripts/**', '*.config.*', '*.cjs'],
		rules: { 'no-console': 'off', '@typescript-eslint/no-explicit-any': 'off' }
	},
	{ files: ['**/*.cjs'], languageOptions: { sourceType: 'commonjs' } },

	layer(['src/lib/domain/**'], [framework, database, server, routes, charts, authjs]),
	layer(['src/lib/schemas/**'], [framework, database, server, routes, charts, authjs]),
	layer(['src/lib/components/**'], [database, server, routes, authjs]),
	layer(['src/lib/components/!(plates)/**', 'src/routes/**'], [database, routes, charts, authjs]),
	layer(
		['src/lib/server/db/**'],
		[
			framework,
			{
				group: ['**/services/**', '**/server/http/**', '**/server/jobs/**'],
				message: 'A query decides nothing and knows no service.'
			},
			routes,
			charts,
			authjs
		]
	),
	layer(
		['src/lib/server/services/**'],
		[
			framework,
			{
				group: ['drizzle-orm', 'drizzle-orm/*', 'mysql2', 'mysql2/*', '**/db/schema', '**/db/schema/*'],
				message: 'A service asks queries; it writes none.'
			},
			{ group: ['**/server/http/**', '../../http/*'], message: 'A service knows no HTTP.' },
			routes,
			charts,
			authjs
		]
	),
	layer(
		['src/lib/server/jobs/**'],
		[
			framework,
			{ group: ['**/server/http/**', '../http/*'], message: 'A job knows no HTTP.' },
			routes,
			charts,
			authjs
		]
	)
);
