import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { partEdit, partInput, partsQuery, priceInput } from '../../../src/lib/schemas/part';
import { sampleEdit, sampleInput, samplesQuery } from '../../../src/lib/schemas/sample';
import type { Context } from '../../../src/lib/server/context';
import { partPrice } from '../../../src/lib/server/db/schema';
import * as audit from '../../../src/lib/server/db/queries/audit';
import { addPartPrice } from '../../../src/lib/server/services/stores/add-part-price';
import { createPart } from '../../../src/lib/server/services/stores/create-part';
import { createSample } from '../../../src/lib/server/services/stores/create-sample';
import { editPart } from '../../../src/lib/server/services/stores/edit-part';
import { editSample } from '../../../src/lib/server/services/stores/edit-sample';
import { listParts } from '../../../src/lib/server/services/stores/list-parts';
import { listSamples } from '../../../src/lib/server/services/stores/list-samples';
import { showPart } from '../../../src/lib/server/services/stores/show-part';
import { showSample } from '../../../src/lib/server/services/stores/show-sample';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { addPart, addRig, addSample, aldermoor, must } from './plan';

let database: TestDatabase;
let staff: Record<Role, Actor>;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	ctx = contextFor(database.db, staff.tester);
});
afterAll(() => database.close());

describe('a part', () => {
	it('is kept with its specification in order and its prices in minor units', async () => {
		const specification = [
			{ name: 'Cores', value: '16' },
			{ name: '', value: '', unit: '' },
			{ name: 'Power limit', value: '170', unit: 'W' }
		];
		const prices = [
			{ amount: '689.90', currency: 'usd', observedOn: '2026-11-01', source: 'list price' },
			{ amount: '', currency: 'USD', observedOn: '2026-11-01' }
		];
		await addPart(ctx, { specification, prices });
		const { part, prices: seen } = await must(showPart(ctx, 'aldermoor-1650'));
		expect(part.specification).toEqual([
			{ name: 'Cores', value: '16' },
			{ name: 'Power limit', value: '170', unit: 'W' }
		]);
		expect(seen).toMatchObject([{ amountMinor: 68990, currency: 'USD', observedOn: '2026-11-01' }]);
		expect(await audit.ofSubject(ctx.db, 'part', part.id)).toMatchObject([
			{ act: 'part.create', actorName: 'Tomas Reyl' }
		]);
	});

	it('is refused a second slug of the same name, beside the field', async () => {
		await addPart(ctx);
		const again = await createPart(ctx, partInput.parse(aldermoor));
		expect(again).toMatchObject({ ok: false, reason: 'conflict', fields: { slug: [expect.any(String)] } });
	});

	it('asks for a slug where none can be made from the name', async () => {
		const named = await createPart(ctx, partInput.parse({ kind: 'memory', maker: '内', model: '存' }));
		expect(named).toMatchObject({ ok: false, reason: 'invalid', fields: { slug: [expect.any(String)] } });
	});

	it('refuses slugs that scripts could not tell from ids, or that the addresses use', () => {
		for (const slug of ['1650', 'new', 'Größe', 'a b', '-a'])
			expect(partInput.safeParse({ ...aldermoor, slug }).success, slug).toBe(false);
	});

	it('shows the latest price in the list, whatever the order they were noted in', async () => {
		await addPart(ctx);
		for (const [amount, observedOn] of [
			['709', '2026-10-01'],
			['689', '2026-11-01'],
			['729', '2026-09-01']
		])
			await must(
				addPartPrice(ctx, 'aldermoor-1650', priceInput.parse({ amount, currency: 'EUR', observedOn }))
			);
		const list = await must(listParts(ctx, partsQuery.parse({})));
		expect(list.rows).toMatchObject([
			{ slug: 'aldermoor-1650', samples: 0, price: { amountMinor: 68900, observedOn: '2026-11-01' } }
		]);
	});

	it('refuses a price with too many decimals, no ISO currency, or a day to come', async () => {
		const price = { amount: '12', currency: 'USD', observedOn: '2026-11-01' };
		expect(priceInput.safeParse({ ...price, amount: '12.345' }).error?.issues[0]?.path).toEqual(['amount']);
		expect(priceInput.safeParse({ ...price, currency: 'ZZZ' }).error?.issues[0]?.path).toEqual(['currency']);
		expect(priceInput.safeParse({ ...price, observedOn: '2026-02-30' }).success).toBe(false);
		await addPart(ctx);
		const early = await addPartPrice(
			ctx,
			'aldermoor-1650',
			priceInput.parse({ ...price, observedOn: '2026-11-13' })
		);
		expect(early).toMatchObject({ ok: false, fields: { observedOn: [expect.any(String)] } });
		expect(await ctx.db.select().from(partPrice)).toEqual([]);
	});

	it('keeps the first of two edits made at once and tells the second', async () => {
		await addPart(ctx);
		const edit = (model: string) => partEdit.parse({ ...aldermoor, model, version: 1 });
		expect(await editPart(ctx, 'aldermoor-1650', edit('1650 X'))).toMatchObject({ ok: true });
		expect(await editPart(ctx, 'aldermoor-1650', edit('1650 Y'))).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		const { part } = await must(showPart(ctx, 'aldermoor-1650'));
		expect(part).toMatchObject({ model: '1650 X', version: 2, slug: 'aldermoor-1650' });
	});

	it('keeps markup as the text it is', async () => {
		const bad = '<script>alert(1)</script>';
		const { slug } = await addPart(ctx, {
			maker: bad,
			model: bad,
			specification: [{ name: bad, value: bad }]
		});
		const { part } = await must(showPart(ctx, slug));
		expect(part).toMatchObject({ maker: bad, model: bad, specification: [{ name: bad, value: bad }] });
		expect(slug).toBe('script-alert-1-script-script-alert-1-script');
	});

	it('is found by words in any order, filtered by kind, and never by a wildcard', async () => {
		await addPart(ctx);
		await addPart(ctx, { kind: 'board', maker: 'Hollin', model: 'Forge X' });
		const slugs = async (query: object) =>
			(await must(listParts(ctx, partsQuery.parse(query)))).rows.map((row) => row.slug);
		expect(await slugs({ q: 'forge hollin' })).toEqual(['hollin-forge-x']);
		expect(await slugs({ kind: 'processor' })).toEqual(['aldermoor-1650']);
		expect(await slugs({ q: '%' })).toEqual([]);
		expect(await slugs({ sort: 'name', way: 'down' })).toEqual(['hollin-forge-x', 'aldermoor-1650']);
	});
});

describe('a sample', () => {
	it('gets the next number of its part, also when several are added at once', async () => {
		await addPart(ctx);
		const made = await Promise.all(Array.from({ length: 5 }, () => addSample(ctx)));
		expect(made.map((sample) => sample.slug).sort()).toEqual(
			[1, 2, 3, 4, 5].map((n) => `aldermoor-1650-${n}`)
		);
	});

	it('is refused beside the field when its part is not there or its code is taken', async () => {
		const unknown = await createSample(ctx, sampleInput.parse({ part: 'nowhere', provenance: 'bought' }));
		expect(unknown).toMatchObject({ ok: false, fields: { part: [expect.any(String)] } });
		await addPart(ctx);
		await addSample(ctx, { slug: 'n-101' });
		const taken = await createSample(
			ctx,
			sampleInput.parse({ part: 'aldermoor-1650', provenance: 'bought', slug: 'n-101' })
		);
		expect(taken).toMatchObject({ ok: false, reason: 'conflict', fields: { slug: [expect.any(String)] } });
	});

	it('shows the liaison where it is used and nothing that was measured', async () => {
		await addRig(ctx);
		const liaison = contextFor(database.db, staff.liaison);
		const page = await must(showSample(liaison, 'aldermoor-1650-1'));
		expect(page.rigs).toMatchObject([{ slug: 'n-12', revision: 1, newest: 1 }]);
		expect(Object.keys(page).sort()).toEqual(['campaigns', 'duties', 'rigs', 'sample']);
		const list = await must(listSamples(liaison, samplesQuery.parse({})));
		expect(list.rows).toMatchObject([{ slug: 'aldermoor-1650-1', rigs: [{ slug: 'n-12' }] }]);
	});

	it('tells the terms of a loan to the liaison alone', async () => {
		await addRig(ctx);
		const duties = async (role: Role) =>
			(await must(showSample(contextFor(database.db, staff[role]), 'aldermoor-1650-1'))).duties;
		expect(await duties('liaison')).toEqual({ embargoes: [], disclosures: [], loans: [] });
		expect(await duties('tester')).toBeNull();
	});

	it('is changed over the version that was seen', async () => {
		await addPart(ctx);
		await addSample(ctx);
		const edit = sampleEdit.parse({ version: 1, provenance: 'loaned', place: 'shelf B3' });
		expect(await editSample(ctx, 'aldermoor-1650-1', edit)).toMatchObject({ ok: true });
		expect(await editSample(ctx, 'aldermoor-1650-1', edit)).toMatchObject({ ok: false, reason: 'conflict' });
	});
});

describe('the stores', () => {
	it('are changed by testers and liaisons alone', async () => {
		for (const role of ['writer', 'editor', 'admin'] as const) {
			const other = contextFor(database.db, staff[role]);
			expect(await createPart(other, partInput.parse(aldermoor))).toMatchObject({ reason: 'forbidden' });
		}
		const liaison = contextFor(database.db, staff.liaison);
		expect(await createPart(liaison, partInput.parse(aldermoor))).toMatchObject({ ok: true });
	});
});
