import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { showPart } from '../../../src/lib/server/services/stores/show-part';
import { showProfile } from '../../../src/lib/server/services/bench-plan/show-profile';
import { actions as notePrice } from '../../../src/routes/(staff)/stores/parts/[slug=slug]/+page.server';
import { actions as newWorkload } from '../../../src/routes/(staff)/bench/workloads/new/+page.server';
import { actions as newPart } from '../../../src/routes/(staff)/stores/parts/new/+page.server';
import { actions as editPart } from '../../../src/routes/(staff)/stores/parts/[slug=slug]/edit/+page.server';
import { actions as newProfile } from '../../../src/routes/(staff)/bench/rigs/[rig=slug]/profiles/new/+page.server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { postForm } from '../../support/post-form';
import { addPart, addRig, must } from './plan';

let database: TestDatabase;
let tester: Actor;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	tester = (await people(database.db)).tester;
	ctx = contextFor(database.db, tester);
	await addRig(ctx);
});
afterAll(() => database.close());

const post = (
	action: Parameters<typeof postForm>[1],
	form: Record<string, string>,
	params: Record<string, string> = {}
) => postForm(tester, action, form, params);

const forge = {
	maker: 'Hollin',
	model: 'Forge X',
	kind: 'board',
	'specification.0.name': 'Layers',
	'specification.0.value': '8',
	'specification.1.name': '',
	'specification.1.value': '',
	'prices.0.amount': '412,00',
	'prices.0.currency': 'EUR',
	'prices.0.observedOn': '2026-01-12'
};

describe('a form without scripts', () => {
	it('carries rows, and leads to what it made', async () => {
		expect(await post(newPart.default, forge)).toBe('/stores/parts/hollin-forge-x');
		const { part, prices } = await must(showPart(ctx, 'hollin-forge-x'));
		expect(part.specification).toEqual([{ name: 'Layers', value: '8' }]);
		expect(prices).toMatchObject([{ amountMinor: 41200, currency: 'EUR' }]);
	});

	it('comes back with all that was typed and the error beside its field', async () => {
		const wrong = {
			...forge,
			'prices.0.amount': 'a lot',
			'specification.1.name': 'Slots',
			model: '<script>'
		};
		const refused = await post(newPart.default, wrong);
		expect(refused).toMatchObject({
			status: 422,
			form: {
				data: {
					model: '<script>',
					specification: [{ name: 'Layers' }, { name: 'Slots' }],
					prices: [{ amount: 'a lot' }]
				},
				errors: {
					specification: { 1: { value: [expect.any(String)] } },
					prices: { 0: { amount: [expect.any(String)] } }
				}
			}
		});
	});

	it('names every fault of a price at once, and notes none', async () => {
		const typed = { amount: 'a lot', currency: 'ZZZ', observedOn: 'soon', source: 'a shop' };
		expect(await post(notePrice.price, typed, { slug: 'hollin-forge-x' })).toMatchObject({
			status: 422,
			form: {
				data: typed,
				errors: {
					amount: [expect.stringContaining('figures')],
					currency: [expect.stringContaining('ISO 4217')],
					observedOn: [expect.any(String)]
				}
			}
		});
		const { prices } = await must(showPart(ctx, 'hollin-forge-x'));
		expect(prices).toHaveLength(1);
	});

	it('says of a workload what is wrong beside each field, with the text that was no number', async () => {
		const typed = { name: 'Loop', quantity: '', unit: 's', repeats: '2.5', leastDifferencePercent: 'often' };
		expect(await post(newWorkload.default, typed)).toMatchObject({
			status: 422,
			form: {
				data: { name: 'Loop', unit: 's', repeats: '2.5', leastDifferencePercent: 'often' },
				errors: {
					quantity: [expect.any(String)],
					repeats: [expect.stringContaining('whole')],
					leastDifferencePercent: [expect.stringContaining('figures')],
					better: [expect.any(String)],
					class: [expect.any(String)]
				}
			}
		});
	});

	it('comes back when the service refuses it, as it was typed', async () => {
		await addPart(ctx, { slug: 'taken' });
		const refused = await post(newPart.default, { ...forge, slug: 'taken', 'prices.0.amount': '412,00' });
		expect(refused).toMatchObject({
			status: 409,
			form: {
				valid: false,
				message: expect.stringContaining('taken'),
				data: { slug: 'taken', prices: [{ amount: '412,00' }] },
				errors: { slug: [expect.any(String)] }
			}
		});
	});

	it('is refused over a newer version, with the text kept', async () => {
		const typed = { maker: 'Aldermoor', model: '1650 X', kind: 'processor', version: '9' };
		expect(await post(editPart.default, typed, { slug: 'aldermoor-1650' })).toMatchObject({
			status: 409,
			form: { data: { model: '1650 X' }, message: expect.stringContaining('still here') }
		});
	});

	it('orders settings by the numbers beside them and drops cleared rows', async () => {
		const row = (at: number, order: string, setting: string) => ({
			[`settings.${at}.order`]: order,
			[`settings.${at}.menuPath`]: 'Tuning',
			[`settings.${at}.setting`]: setting,
			[`settings.${at}.value`]: setting && '1',
			[`settings.${at}.unit`]: '',
			[`settings.${at}.quantity`]: 'other',
			[`settings.${at}.note`]: ''
		});
		const typed = {
			name: 'By hand',
			parent: 'stock',
			...row(0, '3', 'C'),
			...row(1, '1', 'A'),
			...row(2, '2', '')
		};
		expect(await post(newProfile.default, { rig: 'n-12', ...typed }, { rig: 'n-12' })).toBe(
			'/bench/rigs/n-12/profiles/by-hand'
		);
		const { lineage } = await must(showProfile(ctx, 'n-12', 'by-hand'));
		expect(lineage.at(-1)?.settings.map((one) => one.setting)).toEqual(['A', 'C']);
	});
});
