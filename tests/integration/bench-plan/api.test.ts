import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { GET as getPart } from '../../../src/routes/api/v1/parts/[part]/+server';
import { GET as listParts, POST as postPart } from '../../../src/routes/api/v1/parts/+server';
import { GET as getProfile } from '../../../src/routes/api/v1/profiles/[profile]/+server';
import { GET as listProfiles, POST as postProfile } from '../../../src/routes/api/v1/profiles/+server';
import { GET as getRig } from '../../../src/routes/api/v1/rigs/[rig]/+server';
import { GET as listRigs, POST as postRig } from '../../../src/routes/api/v1/rigs/+server';
import { GET as listSamples, POST as postSample } from '../../../src/routes/api/v1/samples/+server';
import { GET as listWorkloads, POST as postWorkload } from '../../../src/routes/api/v1/workloads/+server';
import { useApp } from '../../support/app';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent, type Asked } from '../../support/event';
import { people } from '../../support/people';
import { aldermoor, tileRender } from './plan';

let database: TestDatabase;
let staff: Record<Role, Actor>;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
});
afterAll(() => database.close());

type Handler = (event: never) => Promise<Response>;

async function ask(handler: Handler, asked: Asked) {
	const response = await handler(fakeEvent({ actor: staff.tester, ...asked }) as never);
	return { status: response.status, body: (await response.json()) as Record<string, unknown>, response };
}
const post = (handler: Handler, json: unknown, more: Partial<Asked> = {}) =>
	ask(handler, { path: '/api/v1/x', json, ...more });
const get = (handler: Handler, path: string, params: Record<string, string> = {}) =>
	ask(handler, { path, params });

async function bench() {
	await post(postPart, { ...aldermoor, specification: [{ name: 'Cores', value: '16' }] });
	await post(postSample, { part: 'aldermoor-1650', slug: 'n-101', provenance: 'bought' });
	await post(postRig, { name: 'N-12', samples: ['n-101'], firmware: '2.14', firmwareFamily: 'Hollin' });
}

describe('parts', () => {
	it('are added and read by slug and by id, amounts as decimals and as minor units', async () => {
		const prices = [{ amount: '689.90', currency: 'USD', observedOn: '2026-01-10' }];
		const made = await post(postPart, { ...aldermoor, prices });
		expect(made.status).toBe(201);
		expect(made.body).toMatchObject({
			slug: 'aldermoor-1650',
			price: { amount: '689.90', amountMinor: 68990, currency: 'USD' }
		});
		for (const ref of ['aldermoor-1650', String(made.body.id)]) {
			const read = await get(getPart, `/api/v1/parts/${ref}`, { part: ref });
			expect(read.body).toEqual(made.body);
		}
		const none = await get(getPart, '/api/v1/parts/none', { part: 'none' });
		expect(none.status).toBe(404);
		expect(none.response.headers.get('content-type')).toBe('application/problem+json');
	});

	it('are added once, however often the same request is sent', async () => {
		const headers = { 'idempotency-key': 'part-1' };
		const first = await post(postPart, aldermoor, { headers });
		const again = await post(postPart, aldermoor, { headers });
		expect(again.body).toEqual(first.body);
		expect(again.response.headers.get('idempotency-replayed')).toBe('true');
		expect(first.response.headers.get('location')).toBe('/api/v1/parts/aldermoor-1650');
		expect(again.response.headers.get('location')).toBe('/api/v1/parts/aldermoor-1650');
		const list = await get(listParts, '/api/v1/parts');
		expect(list.body.items).toHaveLength(1);
	});

	it('are refused with a problem that names the field', async () => {
		await post(postPart, aldermoor);
		const taken = await post(postPart, aldermoor);
		expect(taken).toMatchObject({ status: 409, body: { errors: { slug: [expect.any(String)] } } });
		const wrong = await post(postPart, {
			kind: 'teapot',
			maker: '',
			prices: [{ amount: 'free', currency: 'USD', observedOn: '2026-01-10' }]
		});
		expect(wrong.status).toBe(422);
		expect(Object.keys(wrong.body.errors as object).sort()).toEqual([
			'kind',
			'maker',
			'model',
			'prices.0.amount'
		]);
	});

	it('come page by page', async () => {
		for (let n = 1; n <= 5; n++) await post(postPart, { ...aldermoor, model: `Model ${n}` });
		const first = await get(listParts, '/api/v1/parts?limit=2');
		expect(first.body.items).toHaveLength(2);
		const second = await get(listParts, `/api/v1/parts?limit=2&after=${String(first.body.next)}`);
		const third = await get(listParts, `/api/v1/parts?limit=2&after=${String(second.body.next)}`);
		const slugs = [first, second, third].flatMap((answer) =>
			(answer.body.items as { slug: string }[]).map((item) => item.slug)
		);
		expect(slugs).toEqual([1, 2, 3, 4, 5].map((n) => `aldermoor-model-${n}`));
		expect(third.body.next).toBeNull();
		expect((await get(listParts, '/api/v1/parts?limit=x')).status).toBe(422);
	});

	it('give markup back as the text it is, as JSON', async () => {
		const made = await post(postPart, { ...aldermoor, model: '<script>alert(1)</script>' });
		expect(made.response.headers.get('content-type')).toBe('application/json');
		expect(made.body.model).toBe('<script>alert(1)</script>');
	});
});

describe('workloads', () => {
	it('are refused in a way a script can act on', async () => {
		const wrong = await post(postWorkload, { ...tileRender, repeats: 'many', better: 'nicer', unit: '' });
		expect(Object.keys(wrong.body.errors as object).sort()).toEqual(['better', 'repeats', 'unit']);
		const made = await post(postWorkload, { ...tileRender, leastDifferencePercent: 1.5 });
		expect(made).toMatchObject({ status: 201, body: { slug: 'tile-render', leastDifferencePercent: 1.5 } });
		const list = await get(listWorkloads, '/api/v1/workloads?class=game');
		expect(list.body.items).toEqual([]);
	});
});

describe('rigs and profiles', () => {
	it('are put together by names alone', async () => {
		await bench();
		const rig = await get(getRig, '/api/v1/rigs/n-12', { rig: 'n-12' });
		expect(rig.body).toMatchObject({
			slug: 'n-12',
			firmwareFamily: 'Hollin',
			revision: 1,
			samples: [{ slug: 'n-101', part: 'aldermoor-1650' }],
			profiles: [{ slug: 'stock', parent: null }]
		});
		expect((await get(listRigs, '/api/v1/rigs?sample=n-101')).body.items).toMatchObject([
			{ slug: 'n-12', firmwareFamily: 'Hollin' }
		]);
		expect((await get(listSamples, '/api/v1/samples?part=aldermoor-1650')).body.items).toMatchObject([
			{ slug: 'n-101', rigs: ['n-12'] }
		]);
	});

	it('carry what follows from the settings', async () => {
		await bench();
		const settings = [
			{
				menuPath: 'Tuning › Clocks',
				setting: 'Reference clock',
				value: '100',
				unit: 'MHz',
				quantity: 'reference-clock'
			},
			{ menuPath: 'Tuning > Clocks', setting: 'Core ratio', value: '49.5', unit: '×', quantity: 'core-ratio' }
		];
		const made = await post(postProfile, { rig: 'n-12', name: 'Fixed 4.95', settings });
		expect(made).toMatchObject({
			status: 201,
			body: {
				slug: 'fixed-4-95',
				parent: 'stock',
				settings: [{ menuPath: 'Tuning > Clocks' }, { value: '49.5' }],
				derived: [{ name: 'Core clock', value: 4950, unit: 'MHz' }]
			}
		});
		const byId = await get(getProfile, '/api/v1/profiles/1', { profile: String(made.body.id) });
		const bySlug = await get(getProfile, '/api/v1/profiles/fixed-4-95?rig=n-12', { profile: 'fixed-4-95' });
		expect(byId.body).toEqual(made.body);
		expect(bySlug.body).toEqual(made.body);
		expect((await get(getProfile, '/api/v1/profiles/stock', { profile: 'stock' })).status).toBe(422);
		const list = await get(listProfiles, '/api/v1/profiles?rig=n-12');
		expect(list.body.items).toMatchObject([{ slug: 'stock', parent: null }, { slug: 'fixed-4-95' }]);
	});

	it('need the scope of their act in a token', async () => {
		const reader: Actor = { ...staff.tester, scopes: ['bench:read'] };
		const refused = await post(postWorkload, tileRender, { actor: reader });
		expect(refused.status).toBe(403);
		const list = await ask(listWorkloads, { path: '/api/v1/workloads', actor: reader });
		expect(list.status).toBe(200);
	});
});
