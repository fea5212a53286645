import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '../../../src/lib/domain/people/roles';
import { listPartners } from '../../../src/lib/server/services/partners/list-partners';
import { addPartner } from '../../../src/lib/server/services/partners/save-partner';
import { partnerInput } from '../../../src/lib/schemas/partner';
import { actions as askForLoan } from '../../../src/routes/(staff)/partners/[slug]/ask/+page.server';
import { actions as newPartner } from '../../../src/routes/(staff)/partners/new/+page.server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { postForm } from '../../support/post-form';

let database: TestDatabase;
let liaison: Actor;
const ctx = () => contextFor(database.db, liaison);
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	liaison = (await people(database.db)).liaison;
});
afterAll(() => database.close());

describe('a new partner', () => {
	it('is refused with an error beside each field, keeps what was typed, and is not added', async () => {
		const typed = { name: '  ', contactName: 'Ada', contactEmail: 'no-address', notes: '<script>' };
		expect(await postForm(liaison, newPartner.default, typed)).toMatchObject({
			status: 422,
			form: {
				data: { contactName: 'Ada', contactEmail: 'no-address', notes: '<script>' },
				errors: {
					name: [expect.stringContaining('needs a name')],
					contactEmail: [expect.stringContaining('e-mail')]
				}
			}
		});
		expect(await listPartners(ctx(), { q: '', page: 1 })).toMatchObject({ ok: true, value: { rows: [] } });
	});

	it('is refused where its name is longer than its column, not cut', async () => {
		expect(await postForm(liaison, newPartner.default, { name: 'x'.repeat(161) })).toMatchObject({
			status: 422,
			form: { data: { name: 'x'.repeat(161) }, errors: { name: [expect.stringContaining('160')] } }
		});
	});
});

describe('a new loan', () => {
	it('is refused with its errors and keeps the words that were typed', async () => {
		await addPartner(ctx(), partnerInput.parse({ name: 'Press desk' }));
		const typed = {
			askedOn: 'soon',
			dueOn: '2026-13-40',
			terms: 'Return it whole.',
			value: '12',
			currency: ''
		};
		expect(await postForm(liaison, askForLoan.default, typed, { slug: 'press-desk' })).toMatchObject({
			status: 422,
			form: {
				data: typed,
				errors: {
					samples: { _errors: [expect.stringContaining('sample')] },
					askedOn: [expect.any(String)],
					dueOn: [expect.any(String)],
					currency: [expect.stringContaining('currency')]
				}
			}
		});
	});
});
