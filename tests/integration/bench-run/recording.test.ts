import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { GridInput, RunInput } from '../../../src/lib/schemas/run';
import type { Context } from '../../../src/lib/server/context';
import { reading, run } from '../../../src/lib/server/db/schema';
import { recordGridReadings } from '../../../src/lib/server/services/bench/record-grid-readings';
import { recordPlainRun } from '../../../src/lib/server/services/bench/record-plain-run';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { summariseCells } from '../../../src/lib/server/services/bench/summarise-cells';
import { voidRun } from '../../../src/lib/server/services/bench/void-run';
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
});

const cell = { profile: 'stock', workload: 'prime-search', unit: 'events/s' };
const sent = (more: Partial<RunInput> = {}): RunInput => ({
	...cell,
	readings: [4568.98, 4710.9],
	ambientC: null,
	startedAt: null,
	notes: '',
	...more
});
const typed = (more: Partial<GridInput> = {}): GridInput => ({
	...cell,
	runKey: 'sitting-0001',
	ambientC: null,
	startedAt: null,
	started: '',
	notes: '',
	othersSeen: null,
	readings: [{ key: 'reading-0001', value: 4568.98 }],
	...more
});
const stored = () => database.db.select().from(reading);
const runs = () => database.db.select().from(run);

describe('a run sent by a script', () => {
	it('comes back with its ids and the cell as it stands', async () => {
		const recorded = valueOf(await recordRun(ctx, campaign, sent()));
		expect(recorded.readings.map((row) => row.value)).toEqual([4568.98, 4710.9]);
		expect(recorded.readings.every((row) => row.id > 0)).toBe(true);
		expect(recorded.summary).toMatchObject({ n: 2, mean: 4639.94 });
		const second = valueOf(await recordRun(ctx, campaign, sent({ readings: [4688.21] })));
		expect(second.summary?.n).toBe(3);
	});

	it('is refused in another unit, which is named, and stores nothing', async () => {
		const refused = await recordRun(ctx, campaign, sent({ unit: 'ms' }));
		expect(refused).toMatchObject({ ok: false, reason: 'invalid' });
		expect(refused.ok ? '' : refused.fields?.unit?.[0]).toContain('events/s');
		expect(await stored()).toEqual([]);
	});

	it('in a unit that measures something else is refused with both kinds named', async () => {
		const refused = await recordRun(ctx, campaign, sent({ unit: 'W' }));
		expect(refused.ok ? '' : refused.message).toContain(
			'W is a power, but prime-search is measured in events/s'
		);
	});

	it('a thousand times off is stored, with a warning', async () => {
		expect(valueOf(await recordRun(ctx, campaign, sent())).warnings).toEqual([]);
		const off = valueOf(await recordRun(ctx, campaign, sent({ readings: [4701, 4_701_000] })));
		expect(off.warnings).toEqual([expect.stringMatching(/^Reading 2: .*about 1000 times the others/)]);
		expect(await stored()).toHaveLength(4);
	});

	it('into an empty cell is held against the baseline’s', async () => {
		valueOf(await recordRun(ctx, campaign, sent()));
		const off = valueOf(await recordRun(ctx, campaign, sent({ profile: 'huge-pages', readings: [4.7] })));
		expect(off.warnings).toHaveLength(1);
	});

	it('is refused for names that the campaign does not have, with the nearest', async () => {
		const refused = await recordRun(ctx, campaign, sent({ workload: 'prime-serch', profile: 'stok' }));
		expect(refused.ok ? '' : refused.fields?.workload?.[0]).toContain('prime-search');
		expect(refused.ok ? '' : refused.fields?.profile?.[0]).toContain('stock');
		expect(await runs()).toEqual([]);
	});

	it('takes ids as well as slugs', async () => {
		const [first] = await database.db.select({ id: run.id }).from(run);
		expect(first).toBeUndefined();
		const recorded = valueOf(await recordRun(ctx, campaign, sent()));
		const [row] = await runs();
		const again = await recordRun(
			ctx,
			String(row?.campaignId),
			sent({ profile: String(row?.profileId), workload: String(row?.workloadId) })
		);
		expect(valueOf(again).workload).toBe(recorded.workload);
	});

	it.each(['writer', 'editor', 'liaison', 'admin'] as const)('is not for a %s', async (role) => {
		const refused = await recordRun({ ...ctx, actor: all[role] }, campaign, sent());
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(await runs()).toEqual([]);
	});
});

describe('readings typed into the grid', () => {
	it('are one run per sitting, in the order typed', async () => {
		valueOf(await recordGridReadings(ctx, campaign, typed()));
		valueOf(
			await recordGridReadings(ctx, campaign, typed({ readings: [{ key: 'reading-0002', value: 4710.9 }] }))
		);
		expect(await runs()).toHaveLength(1);
		expect((await stored()).map((row) => [row.position, row.value])).toEqual([
			[1, 4568.98],
			[2, 4710.9]
		]);
	});

	it('are stored once, however often they are sent, together or apart', async () => {
		const both = typed({
			readings: [
				{ key: 'reading-0001', value: 4568.98 },
				{ key: 'reading-0002', value: 4710.9 }
			]
		});
		const first = valueOf(await recordGridReadings(ctx, campaign, typed()));
		const second = valueOf(await recordGridReadings(ctx, campaign, both));
		const third = valueOf(await recordGridReadings(ctx, campaign, both));
		expect(await stored()).toHaveLength(2);
		expect(second.stored[0]).toEqual(first.stored[0]);
		expect(third.stored).toEqual(second.stored);
	});

	it('are stored once when the same sitting arrives twice at the same moment', async () => {
		const answers = await Promise.all(
			Array.from({ length: 6 }, () => recordGridReadings(ctx, campaign, typed()))
		);
		const ids = answers.map((answer) => valueOf(answer).stored[0]?.id);
		expect(new Set(ids).size).toBe(1);
		expect(await runs()).toHaveLength(1);
		expect(await stored()).toHaveLength(1);
	});

	it('of two testers at once are two runs, and none is lost', async () => {
		const other = { ...ctx, actor: { ...all.writer, roles: ['tester'] as const } };
		const typedBy = (who: string) =>
			Array.from({ length: 8 }, (_, at) =>
				typed({ runKey: `sitting-${who}`, readings: [{ key: `${who}-read-${at}`, value: at + 1 }] })
			);
		await Promise.all([
			...typedBy('one-aaaa').map((input) => recordGridReadings(ctx, campaign, input)),
			...typedBy('two-bbbb').map((input) => recordGridReadings(other, campaign, input))
		]).then((answers) => answers.forEach(valueOf));
		expect(await runs()).toHaveLength(2);
		expect(await stored()).toHaveLength(16);
		const summary = valueOf(await summariseCells(ctx, campaign, null));
		expect(summary.cells.find((one) => one.profile === 'stock')?.n).toBe(16);
	});

	it('bring what stands beside them up to date, and log it', async () => {
		valueOf(await recordGridReadings(ctx, campaign, typed({ ambientC: 20 })));
		valueOf(
			await recordGridReadings(ctx, campaign, typed({ ambientC: 21.5, notes: 'fan cleaned', readings: [] }))
		);
		expect(await runs()).toMatchObject([{ ambientC: 21.5, notes: 'fan cleaned', version: 2 }]);
	});

	it('are not taken into a run that was voided meanwhile', async () => {
		const { run: id } = valueOf(await recordGridReadings(ctx, campaign, typed()));
		valueOf(await voidRun(ctx, campaign, { run: id ?? 0, reason: 'wrong profile' }));
		const late = await recordGridReadings(
			ctx,
			campaign,
			typed({ readings: [{ key: 'reading-0002', value: 1 }] })
		);
		expect(late).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await stored()).toHaveLength(1);
	});

	it('are not taken into a run of another cell', async () => {
		valueOf(await recordGridReadings(ctx, campaign, typed()));
		const strayed = await recordGridReadings(
			ctx,
			campaign,
			typed({ profile: 'huge-pages', readings: [{ key: 'reading-0002', value: 1 }] })
		);
		expect(strayed).toMatchObject({ ok: false, reason: 'invalid' });
		expect(await stored()).toHaveLength(1);
	});

	it('are at most a thousand in a run', async () => {
		const many = (from: number) =>
			Array.from({ length: 600 }, (_, at) => ({ key: `reading-${from + at}`, value: at }));
		valueOf(await recordGridReadings(ctx, campaign, typed({ readings: many(1000) })));
		const more = await recordGridReadings(ctx, campaign, typed({ readings: many(2000) }));
		expect(more).toMatchObject({ ok: false, reason: 'too_large' });
		expect(await stored()).toHaveLength(600);
	});
});

describe('the plain form, without scripts', () => {
	const plain = (readings: string) => ({
		...cell,
		runKey: 'plain-form-1',
		readings,
		ambient: '21,5',
		started: '2026-11-11T09:30',
		notes: ''
	});

	it('takes one reading a line, with the decimal comma of its writer', async () => {
		valueOf(await recordPlainRun(ctx, campaign, plain('4568,98\n4710,90\n\n4688,21\n')));
		expect((await stored()).map((row) => row.value)).toEqual([4568.98, 4710.9, 4688.21]);
		expect(await runs()).toMatchObject([{ ambientC: 21.5, startedAt: new Date('2026-11-11T09:30:00Z') }]);
	});

	it('stores the same form once', async () => {
		valueOf(await recordPlainRun(ctx, campaign, plain('1\n2')));
		valueOf(await recordPlainRun(ctx, campaign, plain('1\n2')));
		expect(await stored()).toHaveLength(2);
	});

	it.each(['12,5\nfast\n13', 'NaN', '1e400', '<script>alert(1)</script>', ''])(
		'refuses %j whole',
		async (text) => {
			const refused = await recordPlainRun(ctx, campaign, plain(text));
			expect(refused).toMatchObject({ ok: false, reason: 'invalid' });
			expect(refused.ok ? [] : refused.fields?.readings).not.toEqual([]);
			expect(await runs()).toEqual([]);
		}
	);
});
