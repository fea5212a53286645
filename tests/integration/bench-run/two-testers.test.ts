import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { GridInput } from '../../../src/lib/schemas/run';
import type { Context } from '../../../src/lib/server/context';
import { reading } from '../../../src/lib/server/db/schema';
import { recordGridReadings } from '../../../src/lib/server/services/bench/record-grid-readings';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people, person } from '../../support/people';
import { fixtureReadings, plannedCampaign, stockBench, valueOf } from './bench';

let database: TestDatabase;
let tomas: Actor;
let ctx: Context;
let other: Context;
let campaign: string;

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	tomas = (await people(database.db)).tester;
	const pelle = await person(database.db, 'Pelle Vik', 'pelle@northlight.example', ['tester']);
	ctx = contextFor(database.db, tomas);
	other = contextFor(database.db, pelle);
	await stockBench(database.db, tomas, ctx.now);
	campaign = await plannedCampaign(ctx);
});

/** The cell needs seven. */
const sitting = (who: string, values: number[], othersSeen: number | null, from = 0): GridInput => ({
	profile: 'stock',
	workload: 'prime-search',
	unit: 'events/s',
	runKey: `sitting-${who}`,
	ambientC: null,
	startedAt: null,
	started: '',
	notes: '',
	othersSeen,
	readings: values.map((value, at) => ({ key: `${who}-reading-${from + at}`, value }))
});
const stored = async () => (await database.db.select().from(reading)).map((row) => row.value);

describe('two testers in one cell', () => {
	it('fill it together while it wants readings', async () => {
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [1, 2, 3], 0)));
		valueOf(await recordGridReadings(other, campaign, sitting('pelle', [4, 5, 6, 7], 0)));
		expect(await stored()).toHaveLength(7);
	});

	it('the second is held beyond its need, and told what the first stored', async () => {
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [1, 2, 3, 4, 5, 6], 0)));
		const held = await recordGridReadings(other, campaign, sitting('pelle', [10, 11], 2));
		expect(held).toMatchObject({
			ok: false,
			reason: 'conflict',
			detail: { kind: 'over', needed: 7, othersSeen: 6 }
		});
		const detail = held.ok ? null : (held.detail as { theirs: { value: number; by: string }[] });
		expect(detail?.theirs.map((one) => [one.value, one.by])).toEqual(
			[3, 4, 5, 6].map((value) => [value, tomas.name])
		);
		expect(await stored()).toHaveLength(6);
	});

	it('keeps both when the second says that theirs were seen, and asks again about newer ones', async () => {
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [1, 2, 3, 4, 5, 6], 0)));
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [7], 0, 6)));
		const late = await recordGridReadings(other, campaign, sitting('pelle', [10, 11], 6));
		expect(late).toMatchObject({ ok: false, detail: { othersSeen: 7 } });
		valueOf(await recordGridReadings(other, campaign, sitting('pelle', [10, 11], 7)));
		expect(await stored()).toEqual([1, 2, 3, 4, 5, 6, 7, 10, 11]);
	});

	it('a sending whose answer was lost is no conflict: it is stored already', async () => {
		valueOf(await recordGridReadings(other, campaign, sitting('pelle', [10, 11], 0)));
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [1, 2, 3, 4, 5], 2)));
		const again = valueOf(await recordGridReadings(other, campaign, sitting('pelle', [10, 11], 0)));
		expect(again.stored).toHaveLength(2);
		expect(await stored()).toHaveLength(7);
	});

	it('at the same moment over the last reading: one is stored, the other held', async () => {
		valueOf(await recordGridReadings(ctx, campaign, sitting('tomas', [1, 2, 3, 4, 5, 6], 0)));
		const answers = await Promise.all([
			recordGridReadings(ctx, campaign, sitting('tomas', [7], 0, 6)),
			recordGridReadings(other, campaign, sitting('pelle', [8], 6))
		]);
		expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
		expect(await stored()).toHaveLength(7);
	});
});

describe('two testers in one column', () => {
	const tuned = fixtureReadings().find((row) => row.profile !== 'stock')?.profile ?? '';

	it('do not wait for each other, however long the first takes to be stored', async () => {
		const done: string[] = [];
		await database.db.transaction(async (db) => {
			valueOf(await recordGridReadings({ ...ctx, db }, campaign, sitting('tomas', [1, 2], 0)));
			// The first is not committed yet. Would the second wait for it, this would be a deadlock of ours.
			valueOf(await recordGridReadings(other, campaign, { ...sitting('pelle', [3, 4], 0), profile: tuned }));
			done.push('second');
		});
		done.push('first');
		expect(done).toEqual(['second', 'first']);
		expect(await stored()).toEqual([1, 2, 3, 4]);
	});

	it('have one sitting in one cell, though it is sent to two in the same moment', async () => {
		const answers = await Promise.all([
			recordGridReadings(ctx, campaign, sitting('tomas', [1, 2], 0)),
			recordGridReadings(ctx, campaign, { ...sitting('tomas', [1, 2], 0), profile: tuned })
		]);
		expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
		expect(answers.find((answer) => !answer.ok)).toMatchObject({ reason: 'invalid' });
		expect(await stored()).toEqual([1, 2]);
	});
});
