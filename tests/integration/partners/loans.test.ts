import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { embargoInput, loanInput, loanMoveInput, partnerInput } from '../../../src/lib/schemas/partner';
import { loanReminder, mail, part, sample } from '../../../src/lib/server/db/schema';
import { listPartners } from '../../../src/lib/server/services/partners/list-partners';
import { moveLoan } from '../../../src/lib/server/services/partners/move-loan';
import { readLoan } from '../../../src/lib/server/services/partners/read-loan';
import { remindOfLoans } from '../../../src/lib/server/services/partners/remind-of-loans';
import { askForLoan, editLoan } from '../../../src/lib/server/services/partners/save-loan';
import { addPartner } from '../../../src/lib/server/services/partners/save-partner';
import { liftEmbargo, setEmbargo } from '../../../src/lib/server/services/partners/set-embargo';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';

let database: TestDatabase;
let who: Record<Role, Actor>;
const now = new Date('2026-11-11T08:00:00Z');
const as = (role: Role, at = now) => contextFor(database.db, who[role], at);
const system = (at: Date) => ({ db: database.db, now: at, origin: 'https://northlight.example' });

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());

async function openLoan(dueOn = '2026-12-12') {
	const [made] = await database.db
		.insert(part)
		.values({
			slug: 'aldermoor-1650',
			kind: 'processor',
			maker: 'Aldermoor',
			model: '1650',
			specification: [],
			createdAt: now
		})
		.$returningId();
	await database.db
		.insert(sample)
		.values({ slug: 'n-101', partId: made?.id ?? 0, provenance: 'loaned', createdAt: now });
	await addPartner(as('liaison'), partnerInput.parse({ name: 'Aldermoor Press Desk' }));
	const asked = await askForLoan(
		as('liaison'),
		'aldermoor-press-desk',
		loanInput.parse({
			samples: ['n-101'],
			dueOn,
			disclosure: 'Lent by its maker.',
			value: '689,90',
			currency: 'eur'
		})
	);
	if (!asked.ok) throw new Error(asked.message);
	return asked.value.id;
}
const move = (id: number, version: number, name: string, on = '') =>
	moveLoan(as('liaison'), id, loanMoveInput.parse({ version, move: name, on }));

describe('loans', () => {
	beforeEach(async () => {
		await emptyTables(database);
		who = await people(database.db);
	});

	it('go their way with a day for each step, and keep the value exactly', async () => {
		const id = await openLoan();
		expect(await move(id, 1, 'promise')).toMatchObject({ ok: true, value: { stage: 'promised' } });
		expect(await move(id, 2, 'receive', '2026-11-10')).toMatchObject({ ok: true, value: { stage: 'here' } });
		const read = await readLoan(as('liaison'), id);
		expect(read).toMatchObject({
			ok: true,
			value: { loan: { stage: 'here', receivedOn: '2026-11-10', valueMinor: 68990, currency: 'EUR' } }
		});
		if (read.ok)
			expect(read.value.history.map((entry) => entry.act)).toEqual([
				'loan.receive',
				'loan.promise',
				'loan.ask'
			]);
	});

	it('refuse a step that does not follow, and one over a newer version', async () => {
		const id = await openLoan();
		expect(await move(id, 1, 'return')).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await move(id, 1, 'promise')).toMatchObject({ ok: true });
		expect(await move(id, 1, 'receive')).toMatchObject({ ok: false, reason: 'conflict' });
	});

	it('refuse a due date before the day it came', async () => {
		const id = await openLoan();
		await move(id, 1, 'receive', '2026-11-10');
		const edited = await editLoan(as('liaison'), id, {
			version: 2,
			dueOn: '2026-11-09',
			terms: '',
			disclosure: '',
			value: '',
			currency: ''
		});
		expect(edited).toMatchObject({ ok: false, reason: 'invalid', fields: { dueOn: expect.any(Array) } });
	});

	it('are the liaison’s alone', async () => {
		const id = await openLoan();
		for (const role of ['tester', 'writer', 'editor', 'admin'] as const) {
			expect(await readLoan(as(role), id)).toMatchObject({ ok: false, reason: 'forbidden' });
			expect(await listPartners(as(role), { q: '', page: 1 })).toMatchObject({
				ok: false,
				reason: 'forbidden'
			});
			expect(
				await moveLoan(as(role), id, loanMoveInput.parse({ version: 1, move: 'promise' }))
			).toMatchObject({ ok: false, reason: 'forbidden' });
		}
	});

	it('count what is overdue by the publication’s day', async () => {
		const id = await openLoan('2026-11-11');
		await move(id, 1, 'receive', '2026-11-01');
		expect(await listPartners(as('liaison'), { q: '', page: 1 })).toMatchObject({
			value: { rows: [{ owed: 1, overdue: 0 }] }
		});
		expect(
			await listPartners(as('liaison', new Date('2026-11-12T12:00:00Z')), { q: '', page: 1 })
		).toMatchObject({ value: { rows: [{ owed: 1, overdue: 1 }] } });
	});
});

describe('reminders', () => {
	beforeEach(async () => {
		await emptyTables(database);
		who = await people(database.db);
	});

	it('go out once for each day that calls for one, however often the job runs', async () => {
		const id = await openLoan();
		await move(id, 1, 'receive', '2026-11-10');
		for (const day of ['2026-11-27', '2026-11-28', '2026-11-29', '2026-12-09', '2026-12-12', '2026-12-19']) {
			const at = new Date(`${day}T08:00:00Z`);
			await Promise.all([remindOfLoans(system(at)), remindOfLoans(system(at))]);
			await remindOfLoans(system(at));
		}
		const given = await database.db.select().from(loanReminder);
		expect(given.map((row) => row.kind).sort()).toEqual(['before-14', 'before-3', 'due', 'late-7']);
		const mails = await database.db.select().from(mail);
		expect(mails).toHaveLength(4);
		for (const one of mails) expect(one).toMatchObject({ recipient: 'liaison@northlight.example' });
	});

	it('stop when the loan is closed', async () => {
		const id = await openLoan();
		await move(id, 1, 'receive', '2026-11-10');
		await move(id, 2, 'return', '2026-11-11');
		expect(await remindOfLoans(system(new Date('2026-12-12T08:00:00Z')))).toBe(0);
	});
});

describe('embargoes', () => {
	beforeEach(async () => {
		await emptyTables(database);
		who = await people(database.db);
	});
	const embargo = (until: string, zone: string) =>
		embargoInput.parse({ sample: 'n-101', field: 'results', until, zone });

	it('are read in the partner’s own zone', async () => {
		const id = await openLoan();
		await setEmbargo(as('liaison'), id, embargo('2026-11-13T14:00', 'America/New_York'));
		const read = await readLoan(as('liaison'), id);
		// New York keeps UTC−5 in November (IANA time zone database).
		expect(read).toMatchObject({ value: { embargoes: [{ until: new Date('2026-11-13T19:00:00Z') }] } });
	});

	it('refuse a time that the clocks skip, and a zone that is none', async () => {
		const id = await openLoan();
		// Europe/Oslo goes from 02:00 to 03:00 on 28 March 2027 (IANA time zone database).
		expect(await setEmbargo(as('liaison'), id, embargo('2027-03-28T02:30', 'Europe/Oslo'))).toMatchObject({
			ok: false,
			fields: { until: expect.any(Array) }
		});
		expect(
			await setEmbargo(as('liaison'), id, embargo('2027-03-28T04:30', 'Atlantis/Capital'))
		).toMatchObject({ ok: false, fields: { zone: expect.any(Array) } });
	});

	it('are lifted with a reason, once, and stay on record', async () => {
		const id = await openLoan();
		const set = await setEmbargo(as('liaison'), id, embargo('2026-11-13T14:00', 'Europe/Oslo'));
		if (!set.ok) throw new Error(set.message);
		const lift = { embargo: set.value.id, reason: 'The maker announced it early.' };
		expect(await liftEmbargo(as('liaison'), id, lift)).toMatchObject({ ok: true });
		expect(await liftEmbargo(as('liaison'), id, lift)).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await readLoan(as('liaison'), id)).toMatchObject({
			value: { embargoes: [{ liftReason: 'The maker announced it early.' }] }
		});
	});
});
