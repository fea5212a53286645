import type { RowDataPacket } from 'mysql2/promise';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { partsQuery } from '../../../src/lib/schemas/part';
import { profilesApiQuery } from '../../../src/lib/schemas/profile';
import { rigInput, rigsQuery } from '../../../src/lib/schemas/rig';
import { samplesQuery } from '../../../src/lib/schemas/sample';
import { workloadsQuery } from '../../../src/lib/schemas/workload';
import type { Context } from '../../../src/lib/server/context';
import { createRig } from '../../../src/lib/server/services/bench-plan/create-rig';
import { listRigs } from '../../../src/lib/server/services/bench-plan/list-rigs';
import { listWorkloads } from '../../../src/lib/server/services/bench-plan/list-workloads';
import { listProfilesForApi } from '../../../src/lib/server/services/bench-plan/profile-for-api';
import { showRig } from '../../../src/lib/server/services/bench-plan/show-rig';
import { listParts } from '../../../src/lib/server/services/stores/list-parts';
import { listSamples } from '../../../src/lib/server/services/stores/list-samples';
import { showPart } from '../../../src/lib/server/services/stores/show-part';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addPart, addProfile, addRig, addSample, addWorkload, must } from './plan';

let database: TestDatabase;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
	ctx = contextFor(database.db, (await people(database.db)).tester);
});
afterAll(() => database.close());

/** Queries that the server has seen so far; nothing else asks it while this file runs. */
async function asked(): Promise<number> {
	const [rows] = await database.pool.query<RowDataPacket[]>("show global status like 'Com_select'");
	return Number(rows[0]?.Value);
}

async function queriesOf(work: () => Promise<unknown>): Promise<number> {
	const before = await asked();
	await work();
	return (await asked()) - before;
}

const pages = {
	parts: () => must(listParts(ctx, partsQuery.parse({}))),
	'a part': () => must(showPart(ctx, 'aldermoor-1650')),
	samples: () => must(listSamples(ctx, samplesQuery.parse({}))),
	workloads: () => must(listWorkloads(ctx, workloadsQuery.parse({}))),
	rigs: () => must(listRigs(ctx, rigsQuery.parse({}))),
	'a rig': () => must(showRig(ctx, 'n-12')),
	profiles: () => must(listProfilesForApi(ctx, profilesApiQuery.parse({})))
};

async function counts(): Promise<Record<string, number>> {
	const counted: Record<string, number> = {};
	for (const [name, page] of Object.entries(pages)) counted[name] = await queriesOf(page);
	return counted;
}

describe('lists and pages', () => {
	it('ask the database as often for many rows as for one', async () => {
		await addRig(ctx);
		await addWorkload(ctx);
		await addProfile(ctx, { name: 'Fixed' });
		const few = await counts();
		for (let n = 1; n <= 12; n++) {
			await addPart(ctx, { model: `Model ${n}` });
			const sample = await addSample(ctx);
			await addWorkload(ctx, { name: `Workload ${n}` });
			await must(createRig(ctx, rigInput.parse({ name: `Rig ${n}`, samples: [sample.slug] })));
			await addProfile(ctx, { name: `Profile ${n}`, parent: 'fixed' });
		}
		expect(await counts()).toEqual(few);
		expect((await pages.rigs()).total).toBe(13);
	});
});
