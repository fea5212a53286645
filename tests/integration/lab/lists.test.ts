import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import { meaningEdit, meaningInput, meaningsQuery } from '../../../src/lib/schemas/firmware-meaning';
import { instrumentEdit, instrumentInput, instrumentsQuery } from '../../../src/lib/schemas/instrument';
import { labLimitEdit, labLimitInput } from '../../../src/lib/schemas/lab-limit';
import type { Context } from '../../../src/lib/server/context';
import { auditEvent, instrument } from '../../../src/lib/server/db/schema';
import { nameInstrument } from '../../../src/lib/server/services/bench/name-instrument';
import { readPlan } from '../../../src/lib/server/services/bench/read-plan';
import { correctRig } from '../../../src/lib/server/services/bench-plan/correct-rig';
import { createInstrument } from '../../../src/lib/server/services/bench-plan/create-instrument';
import { createLabLimit } from '../../../src/lib/server/services/bench-plan/create-limit';
import { createMeaning } from '../../../src/lib/server/services/bench-plan/create-meaning';
import {
	editInstrument,
	retireInstrument
} from '../../../src/lib/server/services/bench-plan/edit-instrument';
import { editLabLimit } from '../../../src/lib/server/services/bench-plan/edit-limit';
import { editMeaning } from '../../../src/lib/server/services/bench-plan/edit-meaning';
import { listInstruments } from '../../../src/lib/server/services/bench-plan/list-instruments';
import { listLimits } from '../../../src/lib/server/services/bench-plan/list-limits';
import { listMeanings } from '../../../src/lib/server/services/bench-plan/list-meanings';
import { removeLabLimit } from '../../../src/lib/server/services/bench-plan/remove-limit';
import { removeMeaning } from '../../../src/lib/server/services/bench-plan/remove-meaning';
import { showProfile } from '../../../src/lib/server/services/bench-plan/show-profile';
import { rigCorrect } from '../../../src/lib/schemas/rig';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addProfile, addRig, addWorkload, measure, must } from '../bench-plan/plan';

let database: TestDatabase;
let all: Record<'tester' | 'writer' | 'editor' | 'liaison' | 'admin', Actor>;
let ctx: Context;

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
	ctx = contextFor(database.db, all.tester);
});

const meter = (more: object = {}) =>
	instrumentInput.parse({
		name: 'Wattle 3',
		quantity: 'power',
		unit: 'W',
		accuracyPercent: '0,1',
		accuracyAbsolute: '0.2',
		resolution: '0.01',
		calibratedOn: '2026-01-12',
		calibrationDueOn: '2027-01-12',
		...more
	});
const voltage = (more: object = {}) =>
	labLimitInput.parse({
		quantity: 'core-voltage',
		partKind: 'processor',
		limit: '1.35',
		unit: 'V',
		source: 'What we have seen',
		...more
	});
const vcore = (more: object = {}) =>
	meaningInput.parse({ family: 'Hollin', setting: 'Vcore', quantity: 'core-voltage', ...more });
const acts = async () => (await database.db.select().from(auditEvent)).map((event) => event.act);

describe('an instrument', () => {
	it('keeps its limits of error to the digit', async () => {
		await must(createInstrument(ctx, meter()));
		const { rows } = await must(listInstruments(ctx, instrumentsQuery.parse({})));
		expect(rows).toMatchObject([
			{ slug: 'wattle-3', accuracyPercent: 0.1, accuracyAbsolute: 0.2, resolution: 0.01, uses: 0 }
		]);
	});

	it('is refused beside the field: no unit, a calibration due before it was made, a number that is none', () => {
		const typed = { name: 'Wattle 3', quantity: 'power', unit: '' };
		expect(instrumentInput.safeParse(typed).error?.issues[0]?.path).toEqual(['unit']);
		expect(() => meter({ calibrationDueOn: '2025-01-01' })).toThrow('due after the last one');
		expect(() => meter({ accuracyPercent: 'good' })).toThrow('Write a number in figures.');
		expect(() => meter({ resolution: '-1' })).toThrow('from 0 to');
	});

	it('is changed over the version that was seen, and taken out of use', async () => {
		await must(createInstrument(ctx, meter()));
		const change = instrumentEdit.parse({ ...meter({ calibrationDueOn: '2028-01-12' }), version: 1 });
		await must(editInstrument(ctx, 'wattle-3', change));
		expect(await editInstrument(ctx, 'wattle-3', change)).toMatchObject({ ok: false, reason: 'conflict' });
		await must(retireInstrument(ctx, 'wattle-3', { retired: 'yes', version: 2 }));
		expect((await must(listInstruments(ctx, instrumentsQuery.parse({})))).total).toBe(0);
		expect(await acts()).toEqual(
			expect.arrayContaining(['instrument.create', 'instrument.edit', 'instrument.retire'])
		);
	});

	it('is named by a column of a plan, and not anew once it is out of use', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		const { slug } = await measure(ctx);
		await must(createInstrument(ctx, meter()));
		const name = (instrument: string, version: number) =>
			nameInstrument(ctx, slug, { workload: 'tile-render', instrument, version });
		await must(name('wattle-3', 1));
		expect((await must(readPlan(ctx, slug))).workloads).toMatchObject([{ instrument: 'wattle-3' }]);
		expect(await name('', 1)).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await name('no-such', 2)).toMatchObject({ ok: false, reason: 'invalid' });
		await must(name('', 2));
		await must(retireInstrument(ctx, 'wattle-3', { retired: 'yes', version: 1 }));
		expect(await name('wattle-3', 3)).toMatchObject({ ok: false, reason: 'conflict' });
		expect((await must(readPlan(ctx, slug))).workloads).toMatchObject([{ instrument: '' }]);
	});
});

describe('a limit of the lab', () => {
	it('needs a source, a number above 0 and a quantity that is understood', () => {
		expect(() => voltage({ source: ' ' })).toThrow('where the limit is taken from');
		expect(() => voltage({ limit: '0' })).toThrow('above 0');
		expect(() => voltage({ quantity: 'other' })).toThrow('understood');
	});

	it('stands once for a quantity and a kind of part', async () => {
		await must(createLabLimit(ctx, voltage()));
		expect(await createLabLimit(ctx, voltage({ limit: '1.5' }))).toMatchObject({
			ok: false,
			reason: 'conflict',
			fields: { quantity: [expect.any(String)] }
		});
		expect(await must(listLimits(ctx))).toMatchObject([{ limit: 1.35, createdBy: all.tester.name }]);
	});

	it('is changed and removed over the version that was seen, and the log keeps what it said', async () => {
		const { id } = await must(createLabLimit(ctx, voltage()));
		await must(editLabLimit(ctx, id, labLimitEdit.parse({ ...voltage({ limit: '1.3' }), version: 1 })));
		expect(await removeLabLimit(ctx, id, { version: 1 })).toMatchObject({ ok: false, reason: 'conflict' });
		await must(removeLabLimit(ctx, id, { version: 2 }));
		expect(await must(listLimits(ctx))).toEqual([]);
		expect(await acts()).toEqual(expect.arrayContaining(['limit.create', 'limit.edit', 'limit.remove']));
		const events = await database.db.select().from(auditEvent);
		expect(events.find((event) => event.act === 'limit.remove')?.before).toMatchObject({ limit: 1.3 });
	});
});

describe('a meaning', () => {
	it('stands once for a setting of a family; another family may call it the same', async () => {
		await must(createMeaning(ctx, vcore()));
		expect(await createMeaning(ctx, vcore({ quantity: 'soc-voltage' }))).toMatchObject({
			reason: 'conflict'
		});
		await must(createMeaning(ctx, vcore({ family: 'Tarn' })));
		const found = await must(listMeanings(ctx, meaningsQuery.parse({ family: 'Tarn' })));
		expect(found.rows).toHaveLength(1);
		expect(found.families).toEqual(['Hollin', 'Tarn']);
	});

	it('is changed and removed over the version that was seen', async () => {
		const { id } = await must(createMeaning(ctx, vcore()));
		const change = meaningEdit.parse({ ...vcore({ coreGroup: '2' }), version: 1 });
		await must(editMeaning(ctx, id, change));
		expect(await editMeaning(ctx, id, change)).toMatchObject({ reason: 'conflict' });
		expect(await removeMeaning(ctx, id, { version: 1 })).toMatchObject({ reason: 'conflict' });
		await must(removeMeaning(ctx, id, { version: 2 }));
		expect(await removeMeaning(ctx, id, { version: 2 })).toMatchObject({ reason: 'not_found' });
	});

	it('is asked for where a profile’s setting says nothing, with a guess from its name', async () => {
		await addRig(ctx, { firmwareFamily: 'Hollin' });
		const settings = [
			{ menuPath: 'Tweaker', setting: 'Vcore', value: '1.2', unit: 'V', quantity: 'other' as const }
		];
		await addProfile(ctx, { name: 'Limits up', parent: 'stock', settings });
		const asked = async () => (await must(listMeanings(ctx, { family: '' }))).unexplained;
		expect(await asked()).toMatchObject([
			{ family: 'Hollin', setting: 'Vcore', n: 1, suggestion: { quantity: 'core-voltage' } }
		]);
		await must(createMeaning(ctx, vcore()));
		expect(await asked()).toEqual([]);
	});

	it('goes to the profiles of rigs of its family, with the lab’s limits', async () => {
		await addRig(ctx);
		await must(createMeaning(ctx, vcore()));
		await must(createLabLimit(ctx, voltage()));
		expect((await must(showProfile(ctx, 'n-12', 'stock'))).lab).toMatchObject({ family: '', meanings: [] });
		const rig = { version: 1, name: 'N-12', samples: ['aldermoor-1650-1'], firmware: '2.14' };
		await must(correctRig(ctx, 'n-12', rigCorrect.parse({ ...rig, firmwareFamily: 'Hollin' })));
		expect((await must(showProfile(ctx, 'n-12', 'stock'))).lab).toEqual({
			family: 'Hollin',
			meanings: [{ family: 'Hollin', setting: 'Vcore', quantity: 'core-voltage', coreGroup: 0 }],
			limits: [
				{
					quantity: 'core-voltage',
					partKind: 'processor',
					limit: 1.35,
					unit: 'V',
					source: 'What we have seen'
				}
			],
			kinds: ['processor']
		});
	});
});

it.each(['writer', 'editor', 'liaison', 'admin'] as const)(
	'none of them is written by a %s',
	async (role) => {
		const other = { ...ctx, actor: all[role] };
		const refused = [
			createInstrument(other, meter()),
			editInstrument(other, 'x', instrumentEdit.parse({ ...meter(), version: 1 })),
			createLabLimit(other, voltage()),
			editLabLimit(other, 1, { ...voltage(), version: 1 }),
			removeLabLimit(other, 1, { version: 1 }),
			createMeaning(other, vcore()),
			editMeaning(other, 1, { ...vcore(), version: 1 }),
			removeMeaning(other, 1, { version: 1 })
		];
		for (const outcome of await Promise.all(refused)) expect(outcome).toMatchObject({ reason: 'forbidden' });
		expect(await database.db.select().from(instrument)).toEqual([]);
	}
);

it('the liaison sees none of the lab’s lists', async () => {
	const liaison = { ...ctx, actor: all.liaison };
	expect(await listLimits(liaison)).toMatchObject({ reason: 'forbidden' });
	expect(await listMeanings(liaison, { family: '' })).toMatchObject({ reason: 'forbidden' });
	expect(await listInstruments(liaison, instrumentsQuery.parse({}))).toMatchObject({ reason: 'forbidden' });
});
