import { isHttpError, isRedirect } from '@sveltejs/kit';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Act } from '../../src/lib/domain/people/policy';
import { roles, type Actor } from '../../src/lib/domain/people/roles';
import type { Need } from '../../src/lib/server/http/guarded';
import { access, admits } from '../support/access-table';
import { useApp } from '../support/app';
import { testDatabase, type TestDatabase } from '../support/database';
import { fakeEvent } from '../support/event';

type Handler = ((event: unknown) => unknown) & { need?: Need };
type Module = Record<string, unknown> & { actions?: Record<string, Handler> };

const modules = import.meta.glob<Module>([
	'../../src/routes/**/+page.server.ts',
	'../../src/routes/**/+layout.server.ts',
	'../../src/routes/**/+server.ts'
]);
const reachable = ['load', 'GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS', 'fallback'];

interface Found {
	route: string;
	name: string;
	handler: Handler;
}

const routeOf = (file: string) =>
	file
		.replace('../../src/routes', '')
		.replace(/\/\+(page\.server|server)\.ts$/, '')
		.replace(/\/\+layout\.server\.ts$/, '/+layout') || '/';

async function handlersOf([file, load]: [string, () => Promise<Module>]): Promise<Found[]> {
	const module = await load();
	const route = routeOf(file);
	const named = reachable
		.filter((name) => name in module)
		.map((name) => [name, module[name] as Handler] as const);
	const actions = Object.entries(module.actions ?? {}).map(
		([name, handler]) => [`?/${name}`, handler] as const
	);
	return [...named, ...actions].map(([name, handler]) => ({ route, name, handler }));
}

let database: TestDatabase;
let found: Found[];

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	found = (await Promise.all(Object.entries(modules).map(handlersOf))).flat();
}, 240_000);
afterAll(() => database.close());

/** How a handler turns somebody away; 'in' when it does not. */
async function answerTo({ route, name, handler }: Found, actor: Actor | null): Promise<string> {
	const method = name.startsWith('?/') ? 'POST' : name === 'load' ? 'GET' : name;
	try {
		const result = await handler(fakeEvent({ path: route, method, actor }));
		return result instanceof Response ? String(result.status) : 'in';
	} catch (thrown) {
		if (isRedirect(thrown)) return `to ${thrown.location.split('?')[0]}`;
		if (isHttpError(thrown)) return String(thrown.status);
		throw thrown;
	}
}

const closed = () => found.filter(({ handler }) => handler.need !== undefined && handler.need !== 'public');
const isApi = ({ route }: Found) => route.startsWith('/api/');
const somebody = (held: Actor['roles']): Actor => ({
	id: 'x',
	name: 'X',
	email: 'x@northlight.example',
	roles: held
});

describe('the table of access', () => {
	it('has every route and method, each with the act that its handler names', () => {
		const actual: Record<string, Record<string, Need | undefined>> = {};
		for (const { route, name, handler } of found) (actual[route] ??= {})[name] = handler.need;
		expect(actual).toEqual(access);
	});
});

describe('a visitor', () => {
	it('is sent to sign in by pages and forms, and refused with 401 where a script asks', async () => {
		for (const handler of closed()) {
			const isPage = handler.name === 'load' || handler.name.startsWith('?/');
			const expected = isPage ? ['to /sign-in'] : isApi(handler) ? ['401'] : ['401', 'to /sign-in'];
			expect(expected, `${handler.route} ${handler.name}`).toContain(await answerTo(handler, null));
		}
	});
});

describe.each(roles)('a %s', (role) => {
	it('is refused with 403 by every handler whose act is not theirs', async () => {
		for (const handler of closed()) {
			const allowed = admits[handler.handler.need as Act].split(' ');
			if (allowed.includes(role) || allowed.includes('author')) continue;
			expect(await answerTo(handler, somebody([role])), `${handler.route} ${handler.name}`).toBe('403');
		}
	});
});

describe('somebody without a role', () => {
	it('is refused everywhere', async () => {
		for (const handler of closed())
			expect(await answerTo(handler, somebody([])), `${handler.route} ${handler.name}`).toBe('403');
	});
});

describe('a token without scopes', () => {
	it('is refused everywhere, whatever roles its person has', async () => {
		for (const handler of closed())
			expect(
				await answerTo(handler, { ...somebody(roles), scopes: [] }),
				`${handler.route} ${handler.name}`
			).toBe('403');
	});
});
