import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '../../../src/lib/domain/people/roles';
import { campaignInput } from '../../../src/lib/schemas/campaign';
import type { Context } from '../../../src/lib/server/context';
import * as facts from '../../../src/lib/server/db/queries/campaign-facts';
import * as recorded from '../../../src/lib/server/db/queries/campaign-readings';
import { campaign, user } from '../../../src/lib/server/db/schema';
import { fillDemo } from '../../../src/lib/server/demo/fill';
import { excludeReading } from '../../../src/lib/server/services/bench/count-reading';
import { exportReadings } from '../../../src/lib/server/services/bench/export-readings';
import { importReadings } from '../../../src/lib/server/services/bench/import-readings';
import { planCampaign } from '../../../src/lib/server/services/bench/plan-campaign';
import { summariseCells } from '../../../src/lib/server/services/bench/summarise-cells';
import { voidRun } from '../../../src/lib/server/services/bench/void-run';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { valueOf } from './bench';

const now = new Date('2026-11-11T08:40:00Z');
let database: TestDatabase;
let ctx: Context;

beforeAll(async () => {
	database = await testDatabase();
	await fillDemo(database.db, now, 'https://northlight.example');
	ctx = await as('tester');
}, 180_000);
afterAll(() => database.close());

async function as(role: Role): Promise<Context> {
	const people = await database.db.select().from(user);
	const person = people.find(({ email }) => email === `${role}@northlight.example`);
	if (!person) throw new Error(`no ${role}`);
	return contextFor(database.db, { ...person, roles: [role] }, now);
}

async function fileOf(slug: string): Promise<string> {
	const pieces: string[] = [];
	for await (const piece of valueOf(await exportReadings(ctx, slug)).text) pieces.push(piece);
	return pieces.join('');
}

const planOf = async (slug: string) => {
	const all = await database.db.select().from(campaign);
	const id = all.find((row) => row.slug === slug)?.id ?? 0;
	const [plan] = await facts.plansOf(database.db, [id]);
	if (!plan) throw new Error(`no ${slug}`);
	return plan;
};

/** Runs and readings as they count, without their numbers, people and ways. */
async function recordOf(slug: string) {
	const { head } = await planOf(slug);
	const own = (await recorded.forCampaigns(database.db, [head.id])).get(head.id);
	return (own?.runs ?? []).map((run) => ({
		cell: `${run.profile}/${run.workload}`,
		startedAt: run.startedAt,
		ambientC: run.ambientC,
		notes: run.notes,
		voidReason: run.voidReason,
		readings: run.readings.map(({ position, value, excludeReason }) => ({ position, value, excludeReason }))
	}));
}

/** An empty campaign with the same rig, profiles and workloads. */
async function emptyCopy(slug: string, name = `${slug} again`): Promise<string> {
	const { head, profiles, workloads } = await planOf(slug);
	const plan = {
		name,
		rig: head.rigSlug,
		profiles: profiles.map((row) => row.slug),
		workloads: workloads.map((row) => ({ workload: row.slug, repeats: row.needed }))
	};
	return valueOf(await planCampaign(ctx, campaignInput.parse(plan))).slug;
}

/** Everything but who signed what, which no file can carry. */
async function figuresOf(slug: string) {
	const summary = valueOf(await summariseCells(ctx, slug, null));
	return {
		overall: summary.overall,
		cells: summary.cells.map(({ signedBy: _by, signedAt: _at, flagged, ...figures }) => ({
			...figures,
			flagged: flagged.map((one) => one.value)
		}))
	};
}

async function roundTrip(slug: string) {
	const copy = await emptyCopy(slug);
	const file = await fileOf(slug);
	valueOf(await importReadings(ctx, copy, { text: file, leaveRefused: false }));
	return { copy, file };
}

describe('the file of a campaign', () => {
	it('comes back the same into an empty copy, for every campaign of the demo', async () => {
		const slugs = (await database.db.select().from(campaign)).map((row) => row.slug);
		const measured: string[] = [];
		for (const slug of slugs) {
			const record = await recordOf(slug);
			if (record.length === 0) continue;
			measured.push(slug);
			const { copy } = await roundTrip(slug);
			expect(await recordOf(copy)).toEqual(record);
			expect(await figuresOf(copy)).toEqual(await figuresOf(slug));
		}
		expect(measured.length).toBeGreaterThan(3);
	}, 120_000);

	it('keeps what does not count, with its reasons, and the readings to the last bit', async () => {
		const slug = await emptyCopy('aldermoor-1650-four-ways', 'Odd readings');
		const { profiles, workloads } = await planOf(slug);
		const [profile, workload] = [profiles[0]?.slug ?? '', workloads[0]?.slug ?? ''];
		const values = [0.1 + 0.2, 1 / 3, 5e-100, 123456789.12345679, 9.999999999999998e14];
		const file = (name: number, more: string) =>
			`profile,workload,value,notes\n${values.map((value) => `${profile},${workload},${value * name},${more}`).join('\n')}`;
		for (const [at, notes] of ['"=SUM(A1)"', '"two\nlines, and a ""quote"""', '-3'].entries())
			valueOf(await importReadings(ctx, slug, { text: file(1 / (at + 1), notes), leaveRefused: false }));
		const { head } = await planOf(slug);
		const runs = (await recorded.forCampaigns(database.db, [head.id])).get(head.id)?.runs ?? [];
		const [first, second] = runs;
		valueOf(
			await excludeReading(ctx, slug, { reading: first?.readings[1]?.id ?? 0, reason: '=an update ran' })
		);
		valueOf(await voidRun(ctx, slug, { run: second?.id ?? 0, reason: 'wrong profile, “stock”' }));

		const before = await recordOf(slug);
		expect(before).toMatchObject([
			{ notes: '=SUM(A1)', readings: [{}, { excludeReason: '=an update ran' }, {}, {}, {}] },
			{ voidReason: 'wrong profile, “stock”' },
			{ notes: '-3', voidReason: null }
		]);
		const { copy, file: written } = await roundTrip(slug);
		expect(await recordOf(copy)).toEqual(before);
		expect(await figuresOf(copy)).toEqual(await figuresOf(slug));
		expect(written).toContain("'=SUM(A1)");
	});

	it('is taken once', async () => {
		const slugs = (await database.db.select().from(campaign)).map((row) => row.slug);
		const [copy = ''] = slugs.filter((slug) => slug.endsWith('-again'));
		const file = await fileOf(copy.replace(/-again$/, ''));
		expect(await importReadings(ctx, copy, { text: file, leaveRefused: false })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
	});

	it('is not for the liaison, and not of a campaign there is not', async () => {
		expect(await exportReadings(await as('liaison'), 'x')).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(await exportReadings(ctx, 'no-such')).toMatchObject({ ok: false, reason: 'not_found' });
	});
});
