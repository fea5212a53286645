import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { openDatabase, type Database } from '../../../src/lib/server/db/client';
import { newestOf, type CampaignEvent } from '../../../src/lib/server/db/queries/live';
import { eventStream } from '../../../src/lib/server/http/event-stream';
import { hubOver } from '../../../src/lib/server/live/campaign-hub';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { watchCampaign } from '../../../src/lib/server/services/bench/watch-campaign';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { plannedCampaign, stockBench, valueOf } from './bench';

let database: TestDatabase;
/** What another process has: a pool of its own on the same database. */
let elsewhere: Database;
let all: Record<'tester' | 'writer' | 'editor' | 'liaison' | 'admin', Actor>;
let ctx: Context;
let campaign: string;

beforeAll(async () => {
	database = await testDatabase();
	elsewhere = openDatabase(database.url);
});
afterAll(async () => {
	await elsewhere.pool.end();
	await database.close();
});
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
	ctx = contextFor(database.db, all.tester);
	await stockBench(database.db, all.tester, ctx.now);
	campaign = await plannedCampaign(ctx);
});

const record = (by: Context, readings: number[], to = campaign) =>
	recordRun(by, to, {
		profile: 'stock',
		workload: 'prime-search',
		unit: 'events/s',
		readings,
		ambientC: null,
		startedAt: null,
		notes: ''
	}).then(valueOf);

it('what one process stores is told by the hub of another, once, to each who watches that campaign', async () => {
	const { campaign: id, after } = valueOf(await watchCampaign(ctx, campaign, null));
	const hub = hubOver(elsewhere.db, 5);
	const told: CampaignEvent[][] = [[], []];
	const both = new Promise<void>((done) => {
		for (const heard of told)
			hub.watch(
				id,
				after,
				(events) => {
					heard.push(...events);
					if (told.every((one) => one.length >= 2)) done();
				},
				() => undefined
			);
	});
	await record(ctx, [1, 2], await plannedCampaign(ctx, 'Another'));
	await record(ctx, [1, 2]);
	await record(ctx, [3]);
	await both;
	await hub.look();
	for (const heard of told) {
		expect(heard.map(({ act, who, cell, readings }) => [act, who, cell, readings])).toEqual([
			['run.record', all.tester.name, 'stock/prime-search', 2],
			['run.record', all.tester.name, 'stock/prime-search', 1]
		]);
	}
	await hub.stop();
});

it('an entry committed after a greater one is told all the same', async () => {
	const { campaign: id, after } = valueOf(await watchCampaign(ctx, campaign, null));
	const hub = hubOver(elsewhere.db, 3_600_000);
	const heard: number[] = [];
	hub.watch(
		id,
		after,
		(events) => heard.push(...events.map((event) => event.id)),
		() => undefined
	);
	const late = await database.pool.getConnection();
	await late.beginTransaction();
	await late.query(
		"insert into audit_event (at, act, subject_kind, subject_id) values (now(), 'run.record', 'campaign', ?)",
		[String(id)]
	);
	await record(ctx, [1]);
	await hub.look();
	expect(heard).toHaveLength(1);
	await late.commit();
	late.release();
	await hub.look();
	expect(heard).toHaveLength(2);
	expect(heard[1]).toBeLessThan(heard[0] ?? 0);
	await hub.stop();
});

it('a page that comes again is told what it missed', async () => {
	const seen = await newestOf(database.db, valueOf(await watchCampaign(ctx, campaign, null)).campaign);
	await record(ctx, [1]);
	const { campaign: id, after } = valueOf(await watchCampaign(ctx, campaign, seen));
	expect(after).toBe(seen);
	const hub = hubOver(elsewhere.db, 5);
	const [first] = await new Promise<CampaignEvent[]>((done) => {
		hub.watch(id, after, done, () => undefined);
	});
	expect(first?.act).toBe('run.record');
	await hub.stop();
});

it('the hub ends its watches when the process does, and looks at nothing while nobody watches', async () => {
	const hub = hubOver(elsewhere.db, 5);
	let ended = 0;
	const leave = hub.watch(
		1,
		0,
		() => undefined,
		() => (ended += 1)
	);
	leave();
	expect(hub.watching).toBe(0);
	hub.watch(
		1,
		0,
		() => undefined,
		() => (ended += 1)
	);
	await hub.stop();
	hub.watch(
		1,
		0,
		() => undefined,
		() => (ended += 1)
	);
	expect(ended).toBe(2);
	expect(hub.watching).toBe(0);
});

it('a watch is no liaison’s, and of no campaign that is not there', async () => {
	expect(await watchCampaign({ ...ctx, actor: all.liaison }, campaign, null)).toMatchObject({
		reason: 'forbidden'
	});
	expect(await watchCampaign(ctx, 'nowhere', null)).toMatchObject({ reason: 'not_found' });
});

it('the stream ends with the session, at the next message or heartbeat', async () => {
	let allowed = true;
	let left = 0;
	let send = (_id: number) => {};
	const response = eventStream(
		(tools) => {
			send = (id) => tools.send({ event: 'change', id, data: [] });
			return () => (left += 1);
		},
		{ stillAllowed: () => Promise.resolve(allowed) }
	);
	send(7);
	const reader = response.body?.getReader();
	const read = async () => new TextDecoder().decode((await reader?.read())?.value);
	expect(await read()).toBe('retry: 3000\n\n');
	expect(await read()).toBe('id: 7\nevent: change\ndata: []\n\n');
	allowed = false;
	send(8);
	expect((await reader?.read())?.done).toBe(true);
	expect(left).toBe(1);
});
