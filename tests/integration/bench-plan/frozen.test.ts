import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { profileEdit, profileInput } from '../../../src/lib/schemas/profile';
import { rigCorrect, rigInput, rigRevise, rigsQuery } from '../../../src/lib/schemas/rig';
import { workloadEdit, workloadInput } from '../../../src/lib/schemas/workload';
import type { Context } from '../../../src/lib/server/context';
import { profile, rig } from '../../../src/lib/server/db/schema';
import { correctRig } from '../../../src/lib/server/services/bench-plan/correct-rig';
import { createProfile } from '../../../src/lib/server/services/bench-plan/create-profile';
import { createRig } from '../../../src/lib/server/services/bench-plan/create-rig';
import { createWorkload } from '../../../src/lib/server/services/bench-plan/create-workload';
import { editProfile } from '../../../src/lib/server/services/bench-plan/edit-profile';
import { editWorkload } from '../../../src/lib/server/services/bench-plan/edit-workload';
import { listRigs } from '../../../src/lib/server/services/bench-plan/list-rigs';
import { reviseRig } from '../../../src/lib/server/services/bench-plan/revise-rig';
import { showProfile } from '../../../src/lib/server/services/bench-plan/show-profile';
import { showRig } from '../../../src/lib/server/services/bench-plan/show-rig';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addProfile, addRig, addSample, addWorkload, measure, must, tileRender } from './plan';

let database: TestDatabase;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
});
beforeEach(async () => {
	await emptyTables(database);
	ctx = contextFor(database.db, (await people(database.db)).tester);
});
afterAll(() => database.close());

const voltage = (value: string) => ({
	menuPath: 'Tuning > Voltages',
	setting: 'Core voltage',
	value,
	unit: 'V',
	quantity: 'core-voltage' as const
});

describe('a workload', () => {
	const edit = (more: object) => workloadEdit.parse({ ...tileRender, version: 1, ...more });

	it('can change in everything until it is measured', async () => {
		await addWorkload(ctx);
		expect(await editWorkload(ctx, 'tile-render', edit({ unit: 'ms', better: 'higher' }))).toMatchObject({
			ok: true
		});
	});

	it('keeps quantity, unit and direction once it is measured, and says so beside each', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		await measure(ctx);
		const changed = await editWorkload(
			ctx,
			'tile-render',
			edit({ unit: 'ms', better: 'higher', quantity: 'pace' })
		);
		expect(changed).toMatchObject({ ok: false, reason: 'conflict' });
		expect(changed.ok || Object.keys(changed.fields ?? {}).sort()).toEqual(['better', 'quantity', 'unit']);
		expect(
			await editWorkload(ctx, 'tile-render', edit({ name: 'Tile render, kitchen', repeats: 9 }))
		).toMatchObject({ ok: true });
	});

	it('does not let a run slip in while its unit changes', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		const [ran, changed] = await Promise.allSettled([
			measure(ctx),
			editWorkload(ctx, 'tile-render', edit({ unit: 'ms' }))
		]);
		const unitChanged = changed.status === 'fulfilled' && changed.value.ok;
		// Whichever came first, the other was refused: never a run in seconds under a unit of milliseconds.
		expect(unitChanged).toBe(ran.status === 'rejected');
	});

	it('is refused a taken slug, and numbers that are none', async () => {
		await addWorkload(ctx);
		expect(await createWorkload(ctx, workloadInput.parse(tileRender))).toMatchObject({
			reason: 'conflict',
			fields: { slug: [expect.any(String)] }
		});
		for (const wrong of ['many', '', '1e400', 'NaN', 'Infinity', '-1', '0', '1001', '2.5', Infinity, NaN])
			expect(workloadInput.safeParse({ ...tileRender, repeats: wrong }).success, String(wrong)).toBe(false);
		expect(workloadInput.parse({ ...tileRender, leastDifferencePercent: '0,75' })).toMatchObject({
			leastDifferencePercent: 0.75
		});
		for (const wrong of ['0', '100', '0.0001'])
			expect(workloadInput.safeParse({ ...tileRender, leastDifferencePercent: wrong }).success).toBe(false);
	});
});

describe('a rig', () => {
	it('begins with revision 1 and stock, in one go', async () => {
		await addRig(ctx);
		const page = await must(showRig(ctx, 'n-12'));
		expect(page.revisions).toMatchObject([{ number: 1, firmware: '2.14', measured: false }]);
		expect(page.profiles).toMatchObject([{ slug: 'stock', parentId: null, settings: 0 }]);
	});

	it('leaves nothing behind when it is refused', async () => {
		await addRig(ctx);
		const input = rigInput.parse({ name: 'N 12', samples: ['aldermoor-1650-1'] });
		expect(await createRig(ctx, input)).toMatchObject({
			reason: 'conflict',
			fields: { slug: [expect.any(String)] }
		});
		const missing = rigInput.parse({ name: 'N-13', samples: ['aldermoor-1650-1', 'nothing'] });
		expect(await createRig(ctx, missing)).toMatchObject({
			reason: 'invalid',
			fields: { samples: [expect.stringContaining('nothing')] }
		});
		expect(await ctx.db.select().from(rig)).toHaveLength(1);
		expect(await ctx.db.select().from(profile)).toHaveLength(1);
	});

	it('takes a sample once, by slug and id alike', async () => {
		await addRig(ctx);
		const { revisions } = await must(showRig(ctx, 'n-12'));
		const id = String(revisions[0]?.samples[0]?.sampleId);
		const twice = rigInput.parse({ name: 'N-13', samples: ['aldermoor-1650-1', id] });
		expect(await createRig(ctx, twice)).toMatchObject({
			fields: { samples: ['A sample is in a rig once.'] }
		});
	});

	it('is revised with words, and campaigns stay on their revision', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		await measure(ctx);
		const { rig: before } = await must(showRig(ctx, 'n-12'));
		const next = { version: before.version, samples: ['aldermoor-1650-1'], firmware: '2.20' };
		expect(rigRevise.safeParse({ ...next, change: '  ' }).success).toBe(false);
		await must(reviseRig(ctx, 'n-12', rigRevise.parse({ ...next, change: 'Firmware 2.20.' })));
		const page = await must(showRig(ctx, 'n-12'));
		expect(page.revisions).toMatchObject([
			{ number: 2, firmware: '2.20', change: 'Firmware 2.20.', measured: false, campaigns: [] },
			{ number: 1, firmware: '2.14', measured: true, campaigns: [{ slug: 'look-at-stock' }] }
		]);
		expect(await reviseRig(ctx, 'n-12', rigRevise.parse({ ...next, change: 'Again.' }))).toMatchObject({
			reason: 'conflict'
		});
	});

	it('can be mended while nothing was measured on it, and only renamed afterwards', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		const second = await addSample(ctx);
		const mend = (version: number, more: object) =>
			correctRig(
				ctx,
				'n-12',
				rigCorrect.parse({ version, name: 'N-12', samples: ['aldermoor-1650-1'], firmware: '2.14', ...more })
			);
		await must(mend(1, { samples: ['aldermoor-1650-1', second.slug], firmware: '2.15' }));
		await must(mend(2, {}));
		await measure(ctx);
		const { version } = (await must(showRig(ctx, 'n-12'))).rig;
		expect(await mend(version, { firmware: '2.16' })).toMatchObject({ reason: 'conflict' });
		expect(await mend(version, { samples: [second.slug] })).toMatchObject({ reason: 'conflict' });
		expect(await mend(version, { name: 'N-12, the tall one' })).toMatchObject({ ok: true });
		expect((await must(showRig(ctx, 'n-12'))).rig).toMatchObject({
			name: 'N-12, the tall one',
			firmware: '2.14'
		});
	});

	it('is listed as it stands now, found by the sample it has', async () => {
		await addRig(ctx);
		const second = await addSample(ctx);
		const list = async (sample: string) =>
			(await must(listRigs(ctx, rigsQuery.parse({ sample })))).rows.map((row) => row.slug);
		expect(await list('aldermoor-1650-1')).toEqual(['n-12']);
		expect(await list(second.slug)).toEqual([]);
		const moved = { version: 1, samples: [second.slug], change: 'The other processor.' };
		await must(reviseRig(ctx, 'n-12', rigRevise.parse(moved)));
		expect(await list('aldermoor-1650-1')).toEqual([]);
		expect(await list(second.slug)).toEqual(['n-12']);
	});
});

describe('a profile', () => {
	const edit = (version: number, settings: object[], name = 'Fixed') =>
		profileEdit.parse({ version, name, settings });

	beforeEach(async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		await must(editProfile(ctx, 'n-12', 'stock', edit(1, [voltage('1.17')], 'Stock')));
		await addProfile(ctx, { name: 'Fixed', settings: [voltage('1.24')] });
		await addProfile(ctx, { name: 'Switching', parent: 'fixed', settings: [] });
	});

	it('stands over stock, or over the parent it names', async () => {
		const { lineage } = await must(showProfile(ctx, 'n-12', 'switching'));
		expect(lineage.map((one) => one.slug)).toEqual(['stock', 'fixed', 'switching']);
	});

	it('has a slug that is unique within its rig, and one root', async () => {
		const again = await createProfile(ctx, profileInput.parse({ rig: 'n-12', name: 'Fixed' }));
		expect(again).toMatchObject({ reason: 'conflict', fields: { slug: [expect.any(String)] } });
		const { samples } = (await must(showRig(ctx, 'n-12'))).revisions[0] ?? { samples: [] };
		await must(createRig(ctx, rigInput.parse({ name: 'N-13', samples: samples.map((one) => one.slug) })));
		expect(await createProfile(ctx, profileInput.parse({ rig: 'n-13', name: 'Fixed' }))).toMatchObject({
			ok: true
		});
		// The schema itself holds a rig to one root, whoever writes to it.
		const second = ctx.db.update(profile).set({ parentId: null }).where(eq(profile.slug, 'switching'));
		await expect(second).rejects.toThrow();
	});

	it('cannot stand over a profile of another rig', async () => {
		const { samples } = (await must(showRig(ctx, 'n-12'))).revisions[0] ?? { samples: [] };
		await must(createRig(ctx, rigInput.parse({ name: 'N-13', samples: samples.map((one) => one.slug) })));
		const stray = await createProfile(
			ctx,
			profileInput.parse({ rig: 'n-13', name: 'Stray', parent: 'fixed' })
		);
		expect(stray).toMatchObject({ reason: 'invalid', fields: { parent: [expect.any(String)] } });
	});

	it('keeps its settings in the order they were put in', async () => {
		const rows = [
			{ ...voltage('1.2'), setting: 'B', order: '2' },
			{ ...voltage('1.1'), setting: 'A', order: '1' },
			{ order: '3' },
			{ menuPath: 'Tuning > Boost', order: '4' }
		];
		await must(editProfile(ctx, 'n-12', 'switching', edit(1, rows, 'Switching')));
		const { lineage } = await must(showProfile(ctx, 'n-12', 'switching'));
		expect(lineage.at(-1)?.settings.map((one) => one.setting)).toEqual(['A', 'B']);
	});

	it('freezes its settings with the first run, and frees its name and notes', async () => {
		await measure(ctx, 'fixed');
		const refused = await editProfile(ctx, 'n-12', 'fixed', edit(1, [voltage('1.30')]));
		expect(refused).toMatchObject({ reason: 'conflict', message: expect.stringContaining('new profile') });
		expect(await editProfile(ctx, 'n-12', 'fixed', edit(1, [voltage('1.24')], 'Fixed 4.95'))).toMatchObject({
			ok: true
		});
	});

	it('is frozen too when a profile over it was measured, for that inherits its settings', async () => {
		await measure(ctx, 'switching');
		for (const slug of ['stock', 'fixed', 'switching']) {
			const { profile: seen } = await must(showProfile(ctx, 'n-12', slug));
			expect(
				await editProfile(ctx, 'n-12', slug, edit(seen.version, [voltage('1.4')], seen.name)),
				slug
			).toMatchObject({ reason: 'conflict' });
		}
	});

	it('refuses half a setting, and the same setting twice', () => {
		const wrong = (rows: object[]) =>
			profileEdit.safeParse({ version: 1, name: 'x', settings: rows }).error?.issues.map((one) => one.path);
		expect(wrong([{ setting: 'Core voltage' }])).toEqual([['settings', 0, 'value']]);
		expect(wrong([{ value: '1.2' }])).toEqual([['settings', 0, 'setting']]);
		expect(wrong([voltage('1.2'), voltage('1.3')])).toEqual([['settings', 1, 'setting']]);
		expect(wrong([{ ...voltage('1.2'), quantity: 'mood' }])).toEqual([['settings', 0, 'quantity']]);
	});
});
