import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { auditEvent, cellSignature, reading, run } from '../../../src/lib/server/db/schema';
import { importReadings } from '../../../src/lib/server/services/bench/import-readings';
import { previewFile } from '../../../src/lib/server/services/bench/offer-import';
import { signCells } from '../../../src/lib/server/services/bench/sign-cells';
import { voidRun } from '../../../src/lib/server/services/bench/void-run';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { fixture, plannedCampaign, stockBench, valueOf } from './bench';

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

const whole = fixture('readings.csv');
const spoilt = whole
	.replace('4568.98', 'fast')
	.replace('stock,prime-search,events/s,higher,all-core,2', 'stok,prime-search,events/s,higher,all-core,2')
	.replace('stock,prime-search,events/s,higher,all-core,3', 'stock,prime-search,ms,higher,all-core,3');
const take = (text: string, leaveRefused = false) => importReadings(ctx, campaign, { text, leaveRefused });
const runs = () => database.db.select().from(run);
const readings = () => database.db.select().from(reading);

describe('the preview of a file', () => {
	it('shows every row that will be taken', async () => {
		const preview = valueOf(await previewFile(ctx, campaign, whole));
		expect(preview).toMatchObject({ taken: 196, refused: 0, runs: 28, importedBefore: null, doubles: [] });
		expect(preview.rows).toHaveLength(196);
		expect(await runs()).toEqual([]);
	});

	it('says of every row it refuses where it is and why', async () => {
		const preview = valueOf(await previewFile(ctx, campaign, spoilt));
		expect(preview).toMatchObject({ taken: 193, refused: 3 });
		const refused = preview.rows.flatMap((row) => ('refused' in row ? [[row.line, row.refused]] : []));
		expect(refused).toEqual([
			[2, expect.stringContaining('“fast”')],
			[3, expect.stringContaining('stock')],
			[4, expect.stringContaining('events/s')]
		]);
	});

	it('refuses what is no text, and what is too long', async () => {
		expect(await previewFile(ctx, campaign, 'profile\u0000')).toMatchObject({ ok: false, reason: 'invalid' });
		expect(await previewFile(ctx, campaign, whole.repeat(120))).toMatchObject({
			ok: false,
			reason: 'too_large'
		});
	});
});

describe('an import', () => {
	it('makes one run for each cell, its readings in order, begun when the file says', async () => {
		expect(valueOf(await take(whole))).toEqual({ readings: 196, runs: 28, left: 0, signaturesRemoved: 0 });
		const [first] = await runs();
		expect(first).toMatchObject({ source: 'csv', startedAt: new Date('2026-12-01T03:55:13.032Z') });
		const own = (await readings()).filter((row) => row.runId === first?.id);
		expect(own.map((row) => row.position)).toEqual([1, 2, 3, 4, 5, 6, 7]);
		expect(own[0]?.value).toBe(4568.98);
	});

	it('orders the readings of a cell as the file numbers them', async () => {
		valueOf(
			await take(
				'profile,workload,value,repeat\nstock,prime-search,3,3\nstock,prime-search,1,1\nstock,prime-search,2,2'
			)
		);
		expect((await readings()).map((row) => row.value)).toEqual([1, 2, 3]);
	});

	it('stores nothing at all while a row is refused', async () => {
		const before = await database.db.select().from(auditEvent);
		const refused = await take(spoilt);
		expect(refused).toMatchObject({ ok: false, reason: 'invalid' });
		expect(refused.ok ? '' : refused.message).toContain('3 of 196');
		expect(await runs()).toEqual([]);
		expect(await readings()).toEqual([]);
		expect(await database.db.select().from(auditEvent)).toEqual(before);
	});

	it('takes the good rows when the person says to leave the others', async () => {
		expect(valueOf(await take(spoilt, true))).toMatchObject({ readings: 193, left: 3 });
		expect(await readings()).toHaveLength(193);
	});

	it('takes a file once, whatever its line ends, whoever brings it', async () => {
		valueOf(await take(whole));
		expect(await take(`\ufeff${whole.replaceAll('\r\n', '\n')}`)).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		const other = { ...ctx, actor: { ...all.editor, roles: ['tester'] as const } };
		const again = await importReadings(other, campaign, { text: whole, leaveRefused: false });
		expect(again.ok ? '' : again.message).toContain(all.tester.name);
		expect(await readings()).toHaveLength(196);
	});

	it('takes a file once when it arrives twice at the same moment', async () => {
		const answers = await Promise.all([take(whole), take(whole)]);
		expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
		expect(await readings()).toHaveLength(196);
	});

	it('takes a file anew once all its runs are voided', async () => {
		const few = 'profile,workload,value\nstock,prime-search,4700\nstock,prime-search,4710';
		valueOf(await take(few));
		const [first] = await runs();
		valueOf(await voidRun(ctx, campaign, { run: first?.id ?? 0, reason: 'wrong file' }));
		expect(valueOf(await take(few)).readings).toBe(2);
	});

	it('warns of readings that a run has just so already', async () => {
		valueOf(await take('profile,workload,value\nstock,prime-search,4700\nstock,prime-search,4710'));
		const mended =
			'profile,workload,value\nstock,prime-search,4700\nstock,prime-search,4710\nstock,aes-gcm-16k,9';
		const preview = valueOf(await previewFile(ctx, campaign, mended));
		expect(preview.doubles).toMatchObject([{ profile: 'stock', workload: 'prime-search' }]);
	});

	it('takes the signature off each cell it fills', async () => {
		valueOf(await take(whole));
		valueOf(await signCells(ctx, campaign, { profile: '', workload: '' }));
		const more = 'profile,workload,value\nstock,prime-search,4700\nhuge-pages,prime-search,4710';
		expect(valueOf(await take(more)).signaturesRemoved).toBe(2);
		const standing = (await database.db.select().from(cellSignature)).filter((row) => !row.removedAt);
		expect(standing).toHaveLength(26);
	});

	it.each(['writer', 'editor', 'liaison', 'admin'] as const)('is not for a %s', async (role) => {
		const refused = await importReadings({ ...ctx, actor: all[role] }, campaign, {
			text: whole,
			leaveRefused: false
		});
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(await runs()).toEqual([]);
	});
});
