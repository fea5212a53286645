// The layer table of DEVELOPERS.md, checked by what each import resolves to.
const lib = '^src/lib';
const framework = '^node_modules/(svelte|@sveltejs|sveltekit-superforms)/';
const orm = '^node_modules/(drizzle-orm|mysql2)/';

/** @param {string} name @param {string} comment @param {object} from @param {object} to */
const rule = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });
const notTest = '\\.test\\.ts$';

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
	forbidden: [
		rule(
			'no-circles',
			'Two modules that need each other are one module, or three.',
			{},
			{ circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } }
		),
		rule(
			'domain-is-pure',
			'Values in, values out.',
			{ path: `${lib}/domain`, pathNot: notTest },
			{
				path: [
					framework,
					orm,
					`${lib}/(server|components|schemas|articles-preview)`,
					'^src/routes',
					'^(fs|net|http|https|crypto|child_process|path|os)$'
				]
			}
		),
		rule(
			'schemas-are-shared',
			'The browser reads them too.',
			{ path: `${lib}/schemas` },
			{ path: [framework, orm, `${lib}/(server|components)`, '^src/routes'] }
		),
		rule(
			'components-draw',
			'Props in, callbacks out.',
			{ path: `${lib}/components` },
			{ path: [orm, `${lib}/server`, '^src/routes'] }
		),
		rule(
			'queries-only-query',
			'No decision, no service, no HTTP.',
			{ path: `${lib}/server/db` },
			{ path: [framework, `${lib}/server/(services|http|jobs|auth|rendering)`, '^src/routes'] }
		),
		rule(
			'services-know-no-kit',
			'An outcome is a value; HTTP is at the edge.',
			{ path: `${lib}/server/services` },
			{
				path: [
					framework,
					orm,
					`${lib}/server/http/`,
					// Hashing, secrets and limits are a service's to use; sessions and cookies are not.
					`${lib}/server/auth/(?!password|secret|limits)`,
					'^src/routes'
				]
			}
		),
		rule(
			'areas-stay-apart',
			'A service calls queries, not another area’s service.',
			{ path: `${lib}/server/services/([^/]+)/` },
			{ path: `${lib}/server/services/([^/]+)/`, pathNot: `${lib}/server/services/$1/` }
		),
		rule(
			'jobs-know-no-http',
			'A job runs without a request.',
			{ path: `${lib}/server/jobs` },
			{ path: [`${lib}/server/http/`, '^src/routes'] }
		),
		rule(
			'routes-translate',
			'Parse, authorise, call, answer.',
			{ path: '^src/routes' },
			{ path: [orm, `${lib}/server/(db|files)/`] }
		),
		rule(
			'readers-see-editions',
			'The site uses the reader’s services alone.',
			{ path: '^src/routes/\\(reader\\)' },
			{ path: `${lib}/server/services/(?!reader/)` }
		),
		rule(
			'charts-in-plates',
			'LayerChart is imported in one place.',
			{ pathNot: [`${lib}/components/plates`, '^node_modules'] },
			{ path: '^node_modules/layerchart/' }
		),
		rule(
			'auth-in-auth',
			'Auth.js is imported in one place.',
			{ pathNot: [`${lib}/server/auth`, '^node_modules'] },
			{ path: '^node_modules/@auth/' }
		),
		rule(
			'nothing-imports-routes',
			'A route is an end.',
			{ path: lib, pathNot: notTest },
			{ path: '^src/routes' }
		)
	],
	options: {
		doNotFollow: { path: 'node_modules' },
		exclude: { path: '\\.svelte-kit/' },
		tsPreCompilationDeps: true,
		tsConfig: { fileName: 'tsconfig.json' },
		enhancedResolveOptions: {
			exportsFields: ['exports'],
			conditionNames: ['import', 'node', 'default', 'types', 'svelte'],
			extensions: ['.ts', '.js', '.mjs', '.svelte', '.svx', '.json']
		}
	}
};
