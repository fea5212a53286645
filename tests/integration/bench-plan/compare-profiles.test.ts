import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { effectiveSettings } from '../../../src/lib/domain/bench/profile';
import { profileDifference } from '../../../src/lib/domain/bench/tuning/profile-difference';
import type { Context } from '../../../src/lib/server/context';
import { compareProfiles } from '../../../src/lib/server/services/bench-plan/compare-profiles';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addProfile, addRig, must } from './plan';

let database: TestDatabase;
let staff: Awaited<ReturnType<typeof people>>;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	ctx = contextFor(database.db, staff.tester);
	await addRig(ctx);
});
afterAll(() => database.close());

const ratio = (value: string) => ({
	menuPath: 'Tuning',
	setting: 'Core ratio',
	value,
	quantity: 'core-ratio' as const
});
const fans = { menuPath: 'Cooling', setting: 'Fans', value: 'Full' };

describe('two profiles compared', () => {
	it('are any two of the rig, with what they take over', async () => {
		await addProfile(ctx, { name: 'Fixed', settings: [ratio('50'), fans] });
		await addProfile(ctx, { name: 'Higher', parent: 'fixed', settings: [ratio('52')] });
		await addProfile(ctx, { name: 'Apart', settings: [ratio('52')] });
		const { a, b, unknown } = await must(compareProfiles(ctx, 'n-12', 'higher', 'apart'));
		expect(unknown).toEqual([]);
		const { settings } = profileDifference(
			effectiveSettings(a?.lineage ?? []),
			effectiveSettings(b?.lineage ?? [])
		);
		expect(settings.map(({ setting, state }) => [setting, state])).toEqual([
			['Core ratio', 'same'],
			['Fans', 'only-a']
		]);
	});

	it('are stock and none where none is named, and unknown ones are named', async () => {
		const start = await must(compareProfiles(ctx, 'n-12', '', ''));
		expect(start).toMatchObject({ a: { slug: 'stock' }, b: null, unknown: [] });
		const wrong = await must(compareProfiles(ctx, 'n-12', 'stok', 'stock'));
		expect(wrong).toMatchObject({ a: null, b: { slug: 'stock' }, unknown: ['stok'] });
		expect(await compareProfiles(ctx, 'n-13', '', '')).toMatchObject({ ok: false, reason: 'not_found' });
	});

	it('are not for those without the bench', async () => {
		const outsider = contextFor(database.db, { ...staff.tester, roles: [] });
		expect(await compareProfiles(outsider, 'n-12', '', '')).toMatchObject({ ok: false, reason: 'forbidden' });
	});
});
