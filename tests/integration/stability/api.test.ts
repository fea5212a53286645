import { count } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { attempt, sweepPass } from '../../../src/lib/server/db/schema';
import { POST as postAttempts } from '../../../src/routes/api/v1/ladders/[ladder]/attempts/+server';
import { GET as getLadder } from '../../../src/routes/api/v1/ladders/[ladder]/+server';
import { GET as listLadders, POST as postLadder } from '../../../src/routes/api/v1/ladders/+server';
import { POST as postPasses } from '../../../src/routes/api/v1/sweeps/[sweep]/passes/+server';
import { GET as getSweep } from '../../../src/routes/api/v1/sweeps/[sweep]/+server';
import { GET as listSweeps, POST as postSweep } from '../../../src/routes/api/v1/sweeps/+server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent, type Asked } from '../../support/event';
import { people } from '../../support/people';
import { ladderTyped, points, stockStability, sweepTyped, tried } from './bench';

let database: TestDatabase;
let staff: Record<Role, Actor>;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	await stockStability(contextFor(database.db, staff.tester));
});
afterAll(() => database.close());

type Handler = (event: never) => Promise<Response>;
interface Answer {
	status: number;
	body: Record<string, unknown>;
}

async function ask(handler: Handler, asked: Omit<Asked, 'path'>): Promise<Answer> {
	const event = fakeEvent({ actor: staff.tester, path: '/api/v1/x', ...asked });
	const response = await handler(event as never);
	return { status: response.status, body: (await response.json()) as Record<string, unknown> };
}
const climb = (attempts: object[], more: Partial<Asked> = {}) =>
	ask(postAttempts, { json: { attempts }, params: { ladder: 'by-hand' }, ...more });
const drive = (passes: object[], more: Partial<Asked> = {}) =>
	ask(postPasses, { json: { passes }, params: { sweep: 'where-to-change-over' }, ...more });
const attemptsStored = async () => (await database.db.select({ n: count() }).from(attempt))[0]?.n;
const passesStored = async () => (await database.db.select({ n: count() }).from(sweepPass))[0]?.n;

describe('ladders', () => {
	it('are begun, listed and read with what to try next', async () => {
		const made = await ask(postLadder, { json: { ...ladderTyped, name: 'Another' } });
		expect(made.status).toBe(201);
		expect(made.body).toMatchObject({
			slug: 'another',
			limits: { volts: 1.3 },
			stresses: [{ slug: 'long-sums', minutes: 30 }, { slug: 'tile-render' }]
		});
		await climb([tried(), tried({ clockMHz: 4900, outcome: 'failed', failure: 'crash', durationMin: 3 })]);
		const read = await ask(getLadder, { params: { ladder: 'by-hand' } });
		// Half way between 4800 and 4900 in steps of 25, by hand.
		expect(read.body).toMatchObject({
			highestPassed: { heaviestMHz: 4800, everydayMHz: null },
			next: [{ stress: 'long-sums', next: { kind: 'try', clockMHz: 4850, volts: 1.2 } }, {}]
		});
		const list = await ask(listLadders, {});
		expect(list.body.items).toMatchObject([{ slug: 'by-hand', attempts: 2 }, { slug: 'another' }]);
	});

	it('take an attempt once, by header and by key', async () => {
		const headers = { 'idempotency-key': 'attempts-1' };
		const first = await climb([tried()], { headers });
		expect(await climb([tried()], { headers })).toEqual(first);
		const keyed = tried({ key: 'bench-pc-0001', clockMHz: 4825 });
		const sent = await climb([keyed, tried({ key: 'bench-pc-0002', clockMHz: 4850 })]);
		const again = await climb([keyed, tried({ key: 'bench-pc-0003', clockMHz: 4875 })]);
		const ids = (answer: Answer) => (answer.body.attempts as { id: number }[]).map((one) => one.id);
		expect(again.body).toMatchObject({ stored: 1 });
		expect(ids(again)[0]).toBe(ids(sent)[0]);
		expect(await attemptsStored()).toBe(4);
	});

	it('take all of a sending or nothing, and say which field is wrong', async () => {
		const wrong = await climb([tried({ volts: 0 }), tried({ outcome: 'failed' })]);
		expect(wrong).toMatchObject({
			status: 422,
			body: {
				errors: { 'attempts.0.volts': [expect.any(String)], 'attempts.1.failure': [expect.any(String)] }
			}
		});
		const stray = await climb([tried(), tried({ stress: 'long-sum' })]);
		expect(stray).toMatchObject({
			status: 422,
			body: { errors: { 'attempts.1.stress': [expect.stringContaining('long-sums')] } }
		});
		const twice = await climb([tried({ key: 'same-key-1' }), tried({ key: 'same-key-1' })]);
		expect(twice.status).toBe(422);
		expect(await attemptsStored()).toBe(0);
	});

	it('are for testers, and not there under other names', async () => {
		const attempts = [tried()];
		for (const role of ['writer', 'liaison'] as const)
			expect((await climb(attempts, { actor: staff[role] })).status).toBe(403);
		expect((await climb(attempts, { actor: null })).status).toBe(401);
		expect((await climb(attempts, { params: { ladder: 'none' } })).status).toBe(404);
		const reader = { ...staff.tester, scopes: ['bench:read' as const] };
		expect((await climb(attempts, { actor: reader })).status).toBe(403);
		expect((await ask(getLadder, { params: { ladder: 'by-hand' }, actor: staff.liaison })).status).toBe(403);
	});
});

describe('sweeps', () => {
	it('are begun, driven and read with their switch point', async () => {
		const made = await ask(postSweep, { json: { ...sweepTyped, name: 'Another' } });
		expect(made).toMatchObject({ status: 201, body: { slug: 'another', switchPoint: null, passes: [] } });
		const shifted = (byA: number) => ({
			points: points.map((point) => ({ ...point, currentA: (point.currentA ?? 0) + byA }))
		});
		const sent = await drive([shifted(-1), shifted(0), shifted(1)]);
		expect(sent).toMatchObject({
			status: 201,
			body: { stored: 3, passes: [{ number: 1 }, {}, { number: 3 }] }
		});
		const read = await ask(getSweep, { params: { sweep: 'where-to-change-over' } });
		const { switchPoint } = read.body as { switchPoint: { crossingA: number; kind: string; setA: number } };
		// R's approx on the antitonic fit: 163.333 A; three passes 1 A apart, so its interval is ±2.48 A.
		expect(switchPoint.crossingA).toBeCloseTo(163.3333, 3);
		expect(switchPoint).toMatchObject({ kind: 'crosses', setA: 159 });
		const list = await ask(listSweeps, {});
		expect(list.body.items).toHaveLength(2);
	});

	it('take a pass once, by header and by key', async () => {
		const headers = { 'idempotency-key': 'pass-1' };
		const first = await drive([{ points }], { headers });
		expect(await drive([{ points }], { headers })).toEqual(first);
		const keyed = { points, key: 'bench-pc-0001' };
		const sent = await drive([keyed]);
		const again = await drive([keyed]);
		expect(again.body).toMatchObject({ stored: 0, passes: sent.body.passes });
		expect(await passesStored()).toBe(2);
	});

	it('ask about what is likely a wrong unit, and refuse what cannot be', async () => {
		const inGHz = points.map((point, at) => (at === 3 ? { ...point, clockMHz: 5.48 } : point));
		const asked = await drive([{ points: inGHz }]);
		expect(asked).toMatchObject({
			status: 422,
			body: { errors: { 'passes.0.points.3.clockMHz': [expect.stringContaining('meant')] } }
		});
		const falling = [...points].reverse();
		expect((await drive([{ points: falling }])).status).toBe(422);
		expect(await passesStored()).toBe(0);
	});

	it('are for testers', async () => {
		expect((await drive([{ points }], { actor: staff.editor })).status).toBe(403);
		expect((await drive([{ points }], { params: { sweep: 'none' } })).status).toBe(404);
	});
});
