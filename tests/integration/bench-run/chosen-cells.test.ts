import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import { chosenSign, chosenUnsign } from '../../../src/lib/schemas/run';
import type { Context } from '../../../src/lib/server/context';
import { cellSignature } from '../../../src/lib/server/db/schema';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { signChosenCells } from '../../../src/lib/server/services/bench/sign-cells';
import { unsignChosenCells } from '../../../src/lib/server/services/bench/unsign-chosen-cells';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { plannedCampaign, stockBench, valueOf } from './bench';

let database: TestDatabase;
let all: Record<'tester' | 'writer' | 'editor' | 'liaison' | 'admin', Actor>;
let ctx: Context;
let campaign: string;

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
	ctx = contextFor(database.db, all.tester);
	await stockBench(database.db, all.tester, ctx.now);
	campaign = await plannedCampaign(ctx);
	for (const profile of ['stock', 'single-core', 'huge-pages'])
		valueOf(
			await recordRun(ctx, campaign, {
				profile,
				workload: 'prime-search',
				unit: 'events/s',
				readings: [4568.98, 4710.9, 4688.21, 4629.34, 4701.22, 4737.8, 4770.62],
				ambientC: null,
				startedAt: null,
				notes: ''
			})
		);
});

const three = 'stock/prime-search\nsingle-core/prime-search\nstock/prime-search-light';
const standing = async () =>
	(await database.db.select().from(cellSignature)).filter((row) => row.removedAt === null).length;

it('signs the complete ones of the chosen cells and no other, and names what is missing', async () => {
	const done = valueOf(await signChosenCells(ctx, campaign, chosenSign.parse({ cell: three })));
	expect(done.signed).toEqual(['stock/prime-search', 'single-core/prime-search']);
	expect(done.missing).toEqual([{ profile: 'stock', workload: 'prime-search-light', taken: 0, needed: 7 }]);
	expect(await standing()).toBe(2);
});

it('takes signatures off the chosen ones, with the reason, and leaves the others', async () => {
	const every = 'stock/prime-search\nsingle-core/prime-search\nhuge-pages/prime-search';
	valueOf(await signChosenCells(ctx, campaign, chosenSign.parse({ cell: every })));
	const input = chosenUnsign.parse({ cell: three, reason: 'the room was warm' });
	expect(valueOf(await unsignChosenCells(ctx, campaign, input)).removed).toBe(2);
	expect(await standing()).toBe(1);
	const removed = (await database.db.select().from(cellSignature)).filter((row) => row.removedAt);
	expect(removed.map((row) => row.removedReason)).toEqual(['the room was warm', 'the room was warm']);
	expect(await unsignChosenCells(ctx, campaign, input)).toMatchObject({ ok: false, reason: 'conflict' });
});

it('changes nothing where one of the cells is not in the plan, and is no writer’s to do', async () => {
	const wrong = chosenSign.parse({ cell: 'stock/prime-search\nstok/prime-search' });
	expect(await signChosenCells(ctx, campaign, wrong)).toMatchObject({ ok: false, reason: 'invalid' });
	const writer = { ...ctx, actor: all.writer };
	const right = chosenSign.parse({ cell: three });
	expect(await signChosenCells(writer, campaign, right)).toMatchObject({ ok: false, reason: 'forbidden' });
	expect(await standing()).toBe(0);
	expect(chosenSign.safeParse({ cell: '' }).success).toBe(false);
});
