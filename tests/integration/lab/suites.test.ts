import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import { blankCampaign, campaignInput } from '../../../src/lib/schemas/campaign';
import { instrumentInput } from '../../../src/lib/schemas/instrument';
import { suiteEdit, suiteInput, suitesQuery } from '../../../src/lib/schemas/suite';
import type { Context } from '../../../src/lib/server/context';
import { auditEvent, run, suite } from '../../../src/lib/server/db/schema';
import { nameInstrument } from '../../../src/lib/server/services/bench/name-instrument';
import { offerPlan } from '../../../src/lib/server/services/bench/offer-plan';
import { archiveCampaign } from '../../../src/lib/server/services/bench/edit-campaign';
import { planCampaign } from '../../../src/lib/server/services/bench/plan-campaign';
import { readPlan } from '../../../src/lib/server/services/bench/read-plan';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { runInput } from '../../../src/lib/schemas/run';
import { archiveSuite } from '../../../src/lib/server/services/bench-plan/archive-suite';
import { createInstrument } from '../../../src/lib/server/services/bench-plan/create-instrument';
import { retireInstrument } from '../../../src/lib/server/services/bench-plan/edit-instrument';
import { createSuite } from '../../../src/lib/server/services/bench-plan/create-suite';
import { editSuite } from '../../../src/lib/server/services/bench-plan/edit-suite';
import { listSuites } from '../../../src/lib/server/services/bench-plan/list-suites';
import { offerSuite } from '../../../src/lib/server/services/bench-plan/offer-suite';
import { showSuite } from '../../../src/lib/server/services/bench-plan/show-suite';
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
	await addRig(ctx);
	await addWorkload(ctx);
	await addWorkload(ctx, { name: 'Archive pack', repeats: 5 });
});

const short = (more: object = {}) =>
	suiteInput.parse({
		name: 'Short',
		workloads: [
			{ workload: 'tile-render', repeats: '3' },
			{ workload: 'archive-pack', repeats: '' }
		],
		...more
	});
const linesOf = async (slug: string) =>
	(await must(showSuite(ctx, slug))).workloads.map((row) => [row.slug, row.repeats]);

describe('a suite', () => {
	it('keeps its workloads in order, with their own repeats where none are named', async () => {
		expect(await must(createSuite(ctx, short()))).toMatchObject({ slug: 'short' });
		expect(await linesOf('short')).toEqual([
			['tile-render', 3],
			['archive-pack', 5]
		]);
	});

	it('is refused without a workload, with one there is not, with one twice', async () => {
		expect(suiteInput.safeParse({ name: 'Short', workloads: [] }).success).toBe(false);
		const stray = await createSuite(ctx, short({ workloads: [{ workload: 'tile-rendr' }] }));
		expect(stray).toMatchObject({
			ok: false,
			fields: { workloads: [expect.stringContaining('Did you mean tile-render?')] }
		});
		const twice = short().workloads.map((row) => ({ ...row, workload: 'tile-render' }));
		expect(await createSuite(ctx, { ...short(), workloads: twice })).toMatchObject({
			ok: false,
			reason: 'invalid'
		});
		expect(await database.db.select().from(suite)).toEqual([]);
	});

	it('is refused a short name that is taken', async () => {
		await must(createSuite(ctx, short()));
		expect(await createSuite(ctx, short())).toMatchObject({
			ok: false,
			fields: { slug: [expect.any(String)] }
		});
	});

	it('is changed over the version that was seen, and says what it was', async () => {
		await must(createSuite(ctx, short()));
		const typed = { name: 'Short', workloads: [{ workload: 'archive-pack' }], version: 1 };
		const change = suiteEdit.parse(typed);
		await must(editSuite(ctx, 'short', change));
		expect(await linesOf('short')).toEqual([['archive-pack', 5]]);
		expect(await editSuite(ctx, 'short', { ...change, name: 'Later' })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		const events = await database.db.select().from(auditEvent);
		expect(events.find((event) => event.act === 'suite.edit')).toMatchObject({
			before: {
				workloads: [
					{ workload: 'tile-render', repeats: 3 },
					{ workload: 'archive-pack', repeats: 5 }
				]
			}
		});
	});

	it('is no longer offered once archived, until it is taken out again', async () => {
		await must(createSuite(ctx, short()));
		await must(archiveSuite(ctx, 'short', { archived: 'yes', version: 1 }));
		const offered = async () => (await must(offerPlan(ctx, { rig: '', from: '', suite: '' }))).suites;
		expect(await offered()).toEqual([]);
		expect((await must(listSuites(ctx, suitesQuery.parse({})))).total).toBe(0);
		expect(await archiveSuite(ctx, 'short', { archived: 'no', version: 1 })).toMatchObject({
			reason: 'conflict'
		});
		await must(archiveSuite(ctx, 'short', { archived: 'no', version: 2 }));
		expect(await offered()).toMatchObject([{ slug: 'short' }]);
	});

	it.each(['writer', 'editor', 'liaison', 'admin'] as const)('is not written by a %s', async (role) => {
		const other = { ...ctx, actor: all[role] };
		expect(await createSuite(other, short())).toMatchObject({ reason: 'forbidden' });
		expect(await editSuite(other, 'short', { ...short(), version: 1 })).toMatchObject({
			reason: 'forbidden'
		});
		expect(await archiveSuite(other, 'short', { archived: 'yes', version: 1 })).toMatchObject({
			reason: 'forbidden'
		});
	});
});

describe('a plan that begins with something', () => {
	const ticked = async (asked: { rig?: string; from?: string; suite?: string }) => {
		const offer = await must(offerPlan(ctx, { rig: '', from: '', suite: '', ...asked }));
		const typed = blankCampaign(offer.rig?.slug ?? '', offer.profiles, offer.workloads, offer.begin);
		return {
			rig: typed.rig,
			name: typed.name,
			profiles: typed.profiles,
			workloads: typed.workloads
				.filter((row) => row.workload !== '')
				.map((row) => [row.workload, row.repeats])
		};
	};

	it('has the suite’s workloads ticked, in its order, and every profile', async () => {
		await must(createSuite(ctx, short()));
		expect(await ticked({ suite: 'short' })).toMatchObject({
			rig: 'n-12',
			profiles: ['stock'],
			workloads: [
				['tile-render', '3'],
				['archive-pack', '5']
			]
		});
	});

	it('copies another campaign’s plan, and none of its readings', async () => {
		await addProfile(ctx, { name: 'Limits up', parent: 'stock', settings: [] });
		const { slug } = await measure(ctx);
		const before = (await database.db.select().from(run)).length;
		expect(await ticked({ from: slug })).toMatchObject({
			rig: 'n-12',
			name: 'Look at stock, again',
			profiles: ['stock'],
			workloads: [['tile-render', '5']]
		});
		expect((await database.db.select().from(run)).length).toBe(before);
	});

	describe('with columns that are read from instruments', () => {
		const meter = (name: string, calibrationDueOn: string) =>
			must(
				createInstrument(ctx, instrumentInput.parse({ name, quantity: 'power', unit: 'W', calibrationDueOn }))
			);
		/** A campaign of both workloads, each read from a meter of its own; the second meter's calibration has lapsed. */
		async function readFromTwo() {
			const plan = {
				name: 'First look',
				rig: 'n-12',
				profiles: ['stock'],
				workloads: [{ workload: 'tile-render' }, { workload: 'archive-pack' }]
			};
			const { slug } = await must(planCampaign(ctx, campaignInput.parse(plan)));
			await meter('Wattle 3', '2027-01-12');
			await meter('Wattle 5', '2026-11-10');
			const name = (workload: string, instrument: string, version: number) =>
				must(nameInstrument(ctx, slug, { workload, instrument, version }));
			await name('tile-render', 'wattle-3', 1);
			await name('archive-pack', 'wattle-5', 2);
			return slug;
		}
		const copyOf = async (from: string) => {
			const offer = await must(offerPlan(ctx, { rig: '', from, suite: '' }));
			return { offer, typed: blankCampaign('n-12', offer.profiles, offer.workloads, offer.begin) };
		};
		const instrumentsOf = async (slug: string) =>
			(await must(readPlan(ctx, slug))).workloads.map((row) => [row.slug, row.instrument]);

		it('carries them, and says of which the calibration has lapsed', async () => {
			const { offer, typed } = await copyOf(await readFromTwo());
			expect(offer.begin?.instruments).toEqual([
				{ workload: 'tile-render', slug: 'wattle-3', name: 'Wattle 3', lapsed: null },
				{
					workload: 'archive-pack',
					slug: 'wattle-5',
					name: 'Wattle 5',
					lapsed: 'calibration overdue since 10 November 2026'
				}
			]);
			const copy = await must(planCampaign(ctx, campaignInput.parse(typed)));
			expect(copy.slug).not.toBe('first-look');
			expect(await instrumentsOf(copy.slug)).toEqual([
				['tile-render', 'wattle-3'],
				['archive-pack', 'wattle-5']
			]);
		});

		it('leaves out one that is retired, and says so', async () => {
			const from = await readFromTwo();
			await must(retireInstrument(ctx, 'wattle-5', { retired: 'yes', version: 1 }));
			const { offer, typed } = await copyOf(from);
			expect(offer.begin?.retired).toEqual([{ workload: 'Archive pack', name: 'Wattle 5' }]);
			const copy = await must(planCampaign(ctx, campaignInput.parse(typed)));
			expect(await instrumentsOf(copy.slug)).toEqual([
				['tile-render', 'wattle-3'],
				['archive-pack', '']
			]);
		});

		it('refuses beside the workloads one that was retired meanwhile, and stores nothing', async () => {
			const { typed } = await copyOf(await readFromTwo());
			await must(retireInstrument(ctx, 'wattle-3', { retired: 'yes', version: 1 }));
			const refused = await planCampaign(ctx, campaignInput.parse(typed));
			expect(refused).toMatchObject({
				ok: false,
				fields: { workloads: [expect.stringContaining('Wattle 3 is no longer in use')] }
			});
			expect(await offerPlan(ctx, { rig: '', from: 'first-look-again', suite: '' })).toMatchObject({
				reason: 'not_found'
			});
			const workloads = typed.workloads.map((row) => ({ ...row, instrument: '' }));
			const mended = await must(planCampaign(ctx, campaignInput.parse({ ...typed, workloads })));
			expect(await instrumentsOf(mended.slug)).toEqual([
				['tile-render', ''],
				['archive-pack', '']
			]);
		});
	});

	it('says so where there is no such campaign or suite', async () => {
		for (const asked of [{ from: 'none' }, { suite: 'none' }])
			expect(await offerPlan(ctx, { rig: '', from: '', suite: '', ...asked })).toMatchObject({
				ok: false,
				reason: 'not_found'
			});
	});

	it('offers a suite what a campaign measures', async () => {
		const { slug } = await measure(ctx);
		const offer = await must(offerSuite(ctx, slug));
		expect(offer.from?.workloads).toEqual([{ slug: 'tile-render', repeats: 5 }]);
		expect(offer.workloads[0]?.slug).toBe('tile-render');
	});
});

it('an archived campaign takes no readings until it is taken out again', async () => {
	const { slug } = await measure(ctx);
	await must(archiveCampaign(ctx, slug, { archived: 'yes', version: 1 }));
	const more = runInput.parse({ workload: 'tile-render', profile: 'stock', unit: 's', readings: [31.1] });
	const refused = await recordRun(ctx, slug, more);
	expect(refused.ok ? '' : refused.message).toContain('archived');
	await must(archiveCampaign(ctx, slug, { archived: 'no', version: 2 }));
	expect(await recordRun(ctx, slug, more)).toMatchObject({ ok: true });
});
