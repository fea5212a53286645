import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { auditEvent } from '../../../src/lib/server/db/schema';
import {
	GET as getInstrument,
	PUT as putInstrument
} from '../../../src/routes/api/v1/instruments/[instrument]/+server';
import {
	GET as listInstruments,
	POST as postInstrument
} from '../../../src/routes/api/v1/instruments/+server';
import { GET as getLimit, PUT as putLimit } from '../../../src/routes/api/v1/limits/[limit]/+server';
import { GET as listLimits, POST as postLimit } from '../../../src/routes/api/v1/limits/+server';
import { GET as getMeaning, PUT as putMeaning } from '../../../src/routes/api/v1/meanings/[meaning]/+server';
import { GET as listMeanings, POST as postMeaning } from '../../../src/routes/api/v1/meanings/+server';
import { GET as getSuite, PUT as putSuite } from '../../../src/routes/api/v1/suites/[suite]/+server';
import { GET as listSuites, POST as postSuite } from '../../../src/routes/api/v1/suites/+server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent, type Asked } from '../../support/event';
import { people } from '../../support/people';
import { addWorkload } from '../bench-plan/plan';

let database: TestDatabase;
let staff: Record<Role, Actor>;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	const ctx = contextFor(database.db, staff.tester);
	await addWorkload(ctx);
	await addWorkload(ctx, { name: 'Archive pack', repeats: 7 });
});
afterAll(() => database.close());

type Handler = (event: never) => Promise<Response>;

async function ask(handler: Handler, asked: Partial<Asked>) {
	const event = fakeEvent({ actor: staff.tester, path: '/api/v1/x', ...asked });
	const response = await handler(event as never);
	return { status: response.status, body: (await response.json()) as Record<string, unknown>, response };
}
const type = ({ response }: { response: Response }) => response.headers.get('content-type');

/** Each list with a row of it, a change of that row, and a field that a wrong row is refused beside. */
const lists = [
	{
		name: 'suites',
		param: 'suite',
		list: listSuites,
		post: postSuite,
		get: getSuite,
		put: putSuite,
		row: {
			name: 'Short',
			workloads: [{ workload: 'tile-render', repeats: 3 }, { workload: 'archive-pack' }]
		},
		shown: {
			slug: 'short',
			purpose: '',
			archived: false,
			workloads: [
				{ workload: 'tile-render', repeats: 3 },
				{ workload: 'archive-pack', repeats: 7 }
			]
		},
		change: { name: 'Shorter', workloads: [{ workload: 'archive-pack' }] },
		changed: { slug: 'short', name: 'Shorter', workloads: [{ workload: 'archive-pack', repeats: 7 }] },
		wrong: { name: '', workloads: [{ workload: 'tile-render' }] },
		fields: ['name'],
		twice: 'slug'
	},
	{
		name: 'instruments',
		param: 'instrument',
		list: listInstruments,
		post: postInstrument,
		get: getInstrument,
		put: putInstrument,
		row: { name: 'Wattle 3', quantity: 'power', unit: 'W', accuracyPercent: 0.1, calibratedOn: '2026-01-12' },
		shown: {
			slug: 'wattle-3',
			accuracyPercent: 0.1,
			calibratedOn: '2026-01-12',
			calibrationDueOn: null,
			retired: false,
			uses: []
		},
		change: { name: 'Wattle 3', quantity: 'power', unit: 'W', calibrationDueOn: '2028-01-12' },
		changed: { slug: 'wattle-3', accuracyPercent: 0, calibratedOn: null, calibrationDueOn: '2028-01-12' },
		wrong: { name: 'Wattle 3', quantity: 'power', unit: '', resolution: 'fine' },
		fields: ['resolution', 'unit'],
		twice: 'slug'
	},
	{
		name: 'limits',
		param: 'limit',
		list: listLimits,
		post: postLimit,
		get: getLimit,
		put: putLimit,
		row: {
			quantity: 'core-voltage',
			partKind: 'processor',
			limit: '1,35',
			unit: 'V',
			source: 'What we have seen'
		},
		shown: { quantity: 'core-voltage', limit: 1.35, createdBy: 'Tomas Reyl' },
		change: { quantity: 'core-voltage', partKind: 'processor', limit: 1.3, unit: 'V', source: 'Seen later' },
		changed: { limit: 1.3, source: 'Seen later' },
		wrong: { quantity: 'other', partKind: 'processor', limit: 0, unit: 'V', source: '' },
		fields: ['limit', 'quantity', 'source'],
		twice: 'quantity'
	},
	{
		name: 'meanings',
		param: 'meaning',
		list: listMeanings,
		post: postMeaning,
		get: getMeaning,
		put: putMeaning,
		row: { family: 'Hollin', setting: 'Vcore', quantity: 'core-voltage' },
		shown: { family: 'Hollin', setting: 'Vcore', coreGroup: 0, createdBy: 'Tomas Reyl' },
		change: { family: 'Hollin', setting: 'Vcore', quantity: 'soc-voltage', coreGroup: 2 },
		changed: { quantity: 'soc-voltage', coreGroup: 2 },
		wrong: { family: '', setting: 'Vcore', quantity: 'warmth' },
		fields: ['family', 'quantity'],
		twice: 'setting'
	}
] as const;

describe.each(lists)('$name', (one) => {
	const make = (more: Partial<Asked> = {}) => ask(one.post, { json: one.row, ...more });
	const at = (made: Record<string, unknown>) => ({ [one.param]: String(made.slug ?? made.id) });

	it('are written down, read where Location says, and listed', async () => {
		const made = await make();
		expect(made).toMatchObject({ status: 201, body: { ...one.shown, version: 1 } });
		const path = made.response.headers.get('location') ?? '';
		expect(path).toBe(`/api/v1/${one.name}/${String(made.body.slug ?? made.body.id)}`);
		expect((await ask(one.get, { path, params: at(made.body) })).body).toEqual(made.body);
		const byId = { [one.param]: String(made.body.id) };
		expect((await ask(one.get, { params: byId })).body).toEqual(made.body);
		const { uses: _, ...listed } = made.body;
		expect((await ask(one.list, {})).body).toEqual({ items: [listed], next: null });
	});

	it('are written once, however often the same request is sent', async () => {
		const headers = { 'idempotency-key': 'a' };
		const first = await make({ headers });
		const again = await make({ headers });
		expect(again.body).toEqual(first.body);
		expect(again.response.headers.get('idempotency-replayed')).toBe('true');
		expect(again.response.headers.get('location')).toBe(first.response.headers.get('location'));
		expect((await ask(one.list, {})).body.items).toHaveLength(1);
	});

	it('are refused as their forms refuse them, beside the field, and nothing is stored', async () => {
		const wrong = await ask(one.post, { json: one.wrong });
		expect(wrong.status).toBe(422);
		expect(type(wrong)).toBe('application/problem+json');
		expect(Object.keys(wrong.body.errors as object).sort()).toEqual(one.fields);
		expect((await ask(one.list, {})).body.items).toEqual([]);
		await make();
		const twice = await make();
		expect(twice).toMatchObject({ status: 409, body: { errors: { [one.twice]: [expect.any(String)] } } });
		expect((await ask(one.post, { body: 'not json' })).status).toBe(400);
	});

	it('are changed over the version that was seen, once however often it is sent', async () => {
		const made = await make();
		const change = (version: number, key?: string) =>
			ask(one.put, {
				method: 'PUT',
				params: at(made.body),
				json: { ...one.change, version },
				headers: key ? { 'idempotency-key': key } : {}
			});
		const first = await change(1, 'a');
		expect(first).toMatchObject({ status: 200, body: { ...one.changed, version: 2 } });
		expect((await change(1, 'a')).body).toEqual(first.body);
		const stale = await change(1);
		expect(stale.status).toBe(409);
		expect(type(stale)).toBe('application/problem+json');
		expect((await ask(one.get, { params: at(made.body) })).body).toEqual(first.body);
		const acts = (await database.db.select().from(auditEvent)).map((event) => event.act);
		expect(acts.filter((act) => act === `${one.param}.edit`)).toHaveLength(1);
	});

	it('are not found where there is none, whatever the address says', async () => {
		for (const ref of ['none', '0', '1e3', '999999999999']) {
			const params = { [one.param]: ref };
			const json = { ...one.change, version: 1 };
			expect((await ask(one.get, { params })).status, ref).toBe(404);
			expect((await ask(one.put, { method: 'PUT', params, json })).status, ref).toBe(404);
		}
	});

	it('need the role and the scope of the act', async () => {
		const reader: Actor = { ...staff.tester, scopes: ['bench:read'] };
		expect((await ask(one.list, { actor: reader })).status).toBe(200);
		for (const actor of [reader, staff.writer, staff.admin]) expect((await make({ actor })).status).toBe(403);
		expect((await make({ actor: null })).status).toBe(401);
		expect((await ask(one.list, { actor: staff.liaison })).status).toBe(403);
	});
});

describe('the lists', () => {
	it('come page by page, and only what is asked for', async () => {
		const settings = ['Vcore', 'Base tick', 'Halo gain'];
		for (const family of ['Hollin', 'Tarn'])
			for (const setting of settings)
				await ask(postMeaning, { json: { family, setting, quantity: 'core-voltage' } });
		const pageAt = (query: string) => ask(listMeanings, { path: `/api/v1/meanings?${query}` });
		const first = await pageAt('family=Tarn&limit=2');
		const second = await pageAt(`family=Tarn&limit=2&after=${String(first.body.next)}`);
		const names = [first, second].flatMap(({ body }) =>
			(body.items as { setting: string }[]).map((item) => item.setting)
		);
		expect(names).toEqual(settings);
		expect(second.body.next).toBeNull();
		expect((await pageAt('q=halo')).body.items).toHaveLength(2);
		expect((await pageAt('limit=many')).status).toBe(422);
	});

	it('name the workload that a suite asks for in vain', async () => {
		const made = await ask(postSuite, { json: { name: 'Short', workloads: [{ workload: 'tile-rendr' }] } });
		expect(made).toMatchObject({
			status: 422,
			body: { errors: { workloads: [expect.stringContaining('Did you mean tile-render?')] } }
		});
	});
});
