import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { cellSignature, reading, run } from '../../../src/lib/server/db/schema';
import { excludeReading, includeReading } from '../../../src/lib/server/services/bench/count-reading';
import { editRun } from '../../../src/lib/server/services/bench/edit-run';
import { readHistory } from '../../../src/lib/server/services/bench/read-history';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { signCells } from '../../../src/lib/server/services/bench/sign-cells';
import { summariseCells } from '../../../src/lib/server/services/bench/summarise-cells';
import { unsignCell } from '../../../src/lib/server/services/bench/unsign-cell';
import { voidRun } from '../../../src/lib/server/services/bench/void-run';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { plannedCampaign, stockBench, valueOf } from './bench';

let database: TestDatabase;
let all: Record<'tester' | 'writer' | 'editor' | 'liaison' | 'admin', Actor>;
let ctx: Context;
let campaign: string;
let runId: number;
let readingIds: number[];

const cell = { profile: 'stock', workload: 'prime-search' };
const values = [4568.98, 4710.9, 4688.21, 4629.34, 4701.22, 4737.8, 4770.62];

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
	const recorded = valueOf(await record(values));
	runId = recorded.id;
	readingIds = recorded.readings.map((row) => row.id);
});

const record = (readings: number[], at: { profile: string; workload: string } = cell) =>
	recordRun(ctx, campaign, {
		...at,
		unit: 'events/s',
		readings,
		ambientC: null,
		startedAt: null,
		notes: ''
	});
const signatures = () => database.db.select().from(cellSignature);
const entries = async () => valueOf(await readHistory(ctx, campaign, { cell: '', page: 1 })).entries;
const figures = async () => {
	const summary = valueOf(await summariseCells(ctx, campaign, null));
	return summary.cells.find((one) => one.profile === cell.profile && one.workload === cell.workload);
};
const [, second = 0] = values;
const secondReading = () => readingIds[1] ?? 0;

describe('a signature', () => {
	it('goes under a complete cell, once', async () => {
		expect(valueOf(await signCells(ctx, campaign, cell)).signed).toEqual(['stock/prime-search']);
		expect(await figures()).toMatchObject({ signedBy: all.tester.name });
		expect(await signCells(ctx, campaign, cell)).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await signatures()).toHaveLength(1);
	});

	it('is refused under a cell that wants readings, which are named', async () => {
		valueOf(await record([2250.1, 2251.7], { profile: 'stock', workload: 'prime-search-light' }));
		const refused = await signCells(ctx, campaign, { profile: 'stock', workload: 'prime-search-light' });
		expect(refused).toMatchObject({ ok: false, reason: 'invalid' });
		expect(refused.ok ? '' : refused.message).toContain('2 of 7');
	});

	it('of the whole campaign goes under what is complete and says what is missing', async () => {
		valueOf(await record([2250.1], { profile: 'stock', workload: 'prime-search-light' }));
		const { signed, missing } = valueOf(await signCells(ctx, campaign, { profile: '', workload: '' }));
		expect(signed).toEqual(['stock/prime-search']);
		expect(missing).toHaveLength(27);
		expect(missing[0]).toEqual({ profile: 'stock', workload: 'prime-search-light', taken: 1, needed: 7 });
	});

	it('stands once when two testers sign at the same moment', async () => {
		const other = { ...ctx, actor: { ...all.editor, roles: ['tester'] as const } };
		const answers = await Promise.all([signCells(ctx, campaign, cell), signCells(other, campaign, cell)]);
		expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
		expect((await signatures()).filter((row) => row.removedAt === null)).toHaveLength(1);
	});

	it.each(['writer', 'editor', 'liaison', 'admin'] as const)('is not given by a %s', async (role) => {
		const refused = await signCells({ ...ctx, actor: all[role] }, campaign, cell);
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
	});

	it('is not given by a token', async () => {
		const token = { ...all.tester, scopes: ['bench:read', 'bench:write'] as const };
		const refused = await signCells({ ...ctx, actor: token }, campaign, cell);
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
	});

	const changes: [string, () => Promise<{ ok: boolean }>][] = [
		['a new reading', () => record([4700])],
		[
			'an exclusion',
			() => excludeReading(ctx, campaign, { reading: secondReading(), reason: 'an update ran' })
		],
		['a voided run', () => voidRun(ctx, campaign, { run: runId, reason: 'wrong profile' })],
		['its signer', () => unsignCell(ctx, campaign, { ...cell, reason: 'look again' })]
	];
	it.each(changes)('is taken off by %s, with the reason kept', async (_what, change) => {
		valueOf(await signCells(ctx, campaign, cell));
		expect((await change()).ok).toBe(true);
		const [signature] = await signatures();
		expect(signature?.removedAt).toEqual(ctx.now);
		expect(signature?.removedReason).toBeTruthy();
		expect(await figures()).toMatchObject({ signedBy: null });
		expect((await entries()).map((entry) => entry.act)).toContain('cell.unsign');
	});

	it('does not stand over readings that were added while it was given', async () => {
		await Promise.all([signCells(ctx, campaign, cell), record([4700])]);
		const cellNow = await figures();
		const [signature] = await signatures();
		// Whichever came first: signed with all eight, or signed with seven and taken off by the eighth.
		if (cellNow?.signedBy) expect(signature?.removedAt).toBeNull();
		else expect(signature?.removedReason).toContain('added after the signature');
		expect(cellNow?.n).toBe(8);
	});
});

describe('an excluded reading', () => {
	it('stays on record, no longer counts, and can be taken back', async () => {
		valueOf(await excludeReading(ctx, campaign, { reading: secondReading(), reason: 'an update ran' }));
		expect(await figures()).toMatchObject({ n: 6 });
		expect(await database.db.select().from(reading)).toHaveLength(7);
		valueOf(await includeReading(ctx, campaign, { reading: secondReading(), reason: 'it did not' }));
		expect(await figures()).toMatchObject({ n: 7 });
	});

	it('is told in the history with before, after and why', async () => {
		valueOf(await excludeReading(ctx, campaign, { reading: secondReading(), reason: 'an update ran' }));
		const [entry] = await entries();
		expect(entry).toMatchObject({
			act: 'reading.exclude',
			who: all.tester.name,
			reason: 'an update ran',
			before: { cell: 'stock/prime-search', value: second, excluded: false },
			after: { value: second, excluded: true }
		});
	});

	it('is excluded once', async () => {
		valueOf(await excludeReading(ctx, campaign, { reading: secondReading(), reason: 'an update ran' }));
		const again = await excludeReading(ctx, campaign, { reading: secondReading(), reason: 'again' });
		expect(again).toMatchObject({ ok: false, reason: 'conflict' });
		expect((await entries()).filter((entry) => entry.act === 'reading.exclude')).toHaveLength(1);
	});

	it('is not found through another campaign', async () => {
		const other = await plannedCampaign(ctx, 'Another');
		const refused = await excludeReading(ctx, other, { reading: secondReading(), reason: 'stray' });
		expect(refused).toMatchObject({ ok: false, reason: 'not_found' });
		expect(await figures()).toMatchObject({ n: 7 });
	});
});

describe('a run', () => {
	it('once voided counts no more and cannot be voided again', async () => {
		valueOf(await voidRun(ctx, campaign, { run: runId, reason: 'wrong profile' }));
		expect(await figures()).toMatchObject({ n: 0, mean: null });
		expect(await voidRun(ctx, campaign, { run: runId, reason: 'again' })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		expect(await database.db.select().from(reading)).toHaveLength(7);
	});

	it('is corrected over the version that was seen, and not over a newer one', async () => {
		const edit = { run: runId, version: 1, ambient: '21.5', started: '', notes: 'door open' };
		valueOf(await editRun(ctx, campaign, edit));
		expect(await database.db.select().from(run)).toMatchObject([{ ambientC: 21.5, notes: 'door open' }]);
		const late = await editRun(ctx, campaign, { ...edit, notes: 'door shut' });
		expect(late).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await database.db.select().from(run)).toMatchObject([{ notes: 'door open' }]);
	});

	it.each(['writer', 'editor', 'liaison', 'admin'] as const)('is not voided by a %s', async (role) => {
		const refused = await voidRun({ ...ctx, actor: all[role] }, campaign, { run: runId, reason: 'x' });
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
	});
});
