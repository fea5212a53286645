import { isRedirect, type ActionFailure } from '@sveltejs/kit';
import { asc, count, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { attempt, auditEvent, ladder, sweepPass } from '../../../src/lib/server/db/schema';
import { editLadder } from '../../../src/lib/server/services/stability/edit-ladder';
import { readLadder } from '../../../src/lib/server/services/stability/read-ladder';
import { readSweep } from '../../../src/lib/server/services/stability/read-sweep';
import { voidAttempt } from '../../../src/lib/server/services/stability/void-attempt';
import { ladderEdit } from '../../../src/lib/schemas/ladder';
import { actions as ladderActions } from '../../../src/routes/(staff)/bench/ladders/[ladder=slug]/+page.server';
import { actions as newLadder } from '../../../src/routes/(staff)/bench/ladders/new/+page.server';
import { actions as sweepActions } from '../../../src/routes/(staff)/bench/sweeps/[sweep=slug]/+page.server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';
import { must } from '../bench-plan/plan';
import { points, stockStability } from './bench';

let database: TestDatabase;
let staff: Record<Role, Actor>;
let ctx: Context;
beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
beforeEach(async () => {
	await emptyTables(database);
	staff = await people(database.db);
	ctx = contextFor(database.db, staff.tester);
	await stockStability(ctx);
});
afterAll(() => database.close());

/** Posts a form as a browser without scripts does; where it leads, or what comes back. */
async function post(action: (event: never) => unknown, form: Record<string, string>) {
	const params = { ladder: 'by-hand', sweep: 'where-to-change-over' };
	try {
		const event = fakeEvent({ path: '/x', form, params, actor: staff.tester });
		const failed = (await action(event as never)) as ActionFailure<Record<string, unknown>>;
		return { status: failed.status, ...failed.data };
	} catch (thrown) {
		if (isRedirect(thrown)) return thrown.location;
		throw thrown;
	}
}

const one = {
	key: 'form-key-0001',
	clockMHz: '4800',
	volts: '1,2',
	stress: 'long-sums',
	durationMin: '30',
	outcome: 'passed',
	failure: '',
	errors: '0',
	peakTempC: '77,5',
	packageW: '',
	ambientC: '',
	started: '2026-11-10T09:30',
	notes: ''
};
const stored = () => database.db.select().from(attempt).orderBy(asc(attempt.id));

describe('the form of an attempt', () => {
	it('stores it once, however often it is sent', async () => {
		expect(await post(ladderActions.record, one)).toBe('/bench/ladders/by-hand?stored=1');
		expect(await post(ladderActions.record, one)).toBe('/bench/ladders/by-hand?stored=1');
		expect(await stored()).toMatchObject([
			{
				clockMhz: 4800,
				volts: 1.2,
				peakTempC: 77.5,
				packageW: null,
				startedAt: new Date('2026-11-10T09:30Z')
			}
		]);
	});

	it('comes back as it was typed, with the same checks as the API', async () => {
		const wrong = { ...one, clockMHz: 'fast' };
		expect(await post(ladderActions.record, wrong)).toMatchObject({
			status: 422,
			form: {
				data: { clockMHz: 'fast', volts: '1,2', outcome: 'passed' },
				errors: { clockMHz: [expect.any(String)] }
			}
		});
		expect(await post(ladderActions.record, { ...one, outcome: 'failed' })).toMatchObject({
			form: { errors: { failure: [expect.any(String)] } }
		});
		expect(await post(ladderActions.record, { ...one, started: 'soon' })).toMatchObject({
			form: { errors: { started: [expect.any(String)] }, data: { started: 'soon' } }
		});
		expect(await stored()).toEqual([]);
	});
});

const row = (at: number, clockMHz: string, more: Record<string, string> = {}) =>
	Object.fromEntries(
		Object.entries({
			clockMHz,
			volts: '1.2',
			stress: 'long-sums',
			durationMin: '30',
			outcome: 'passed',
			failure: '',
			errors: '',
			peakTempC: '',
			packageW: '',
			...more
		}).map(([field, value]) => [`attempts.${at}.${field}`, value])
	);
const empty = { volts: '', durationMin: '' };

describe('the grid', () => {
	it('stores its filled rows once and leaves the empty ones out', async () => {
		const grid = { formKey: 'grid-key-1', ...row(0, '4800'), ...row(1, '', empty), ...row(2, '4900') };
		expect(await post(ladderActions.grid, grid)).toBe('/bench/ladders/by-hand?stored=2');
		expect(await post(ladderActions.grid, grid)).toBe('/bench/ladders/by-hand?stored=2');
		expect((await stored()).map((each) => each.clockMhz)).toEqual([4800, 4900]);
	});

	it('names the row that is wrong, behind an empty one too, and stores none', async () => {
		const grid = { formKey: 'grid-key-1', ...row(0, '4800'), ...row(1, '', empty), ...row(2, '49 GHz') };
		expect(await post(ladderActions.grid, grid)).toMatchObject({
			status: 422,
			form: {
				data: { attempts: [{ clockMHz: '4800' }, { clockMHz: '' }, { clockMHz: '49 GHz' }] },
				errors: { attempts: { 2: { clockMHz: [expect.any(String)] } } }
			}
		});
		expect(await post(ladderActions.grid, { formKey: 'grid-key-1', ...row(0, '', empty) })).toMatchObject({
			status: 422
		});
		expect(await stored()).toEqual([]);
	});
});

describe('a voided attempt', () => {
	it('stays on record with its reason and no longer counts', async () => {
		await post(ladderActions.record, one);
		const [made] = await stored();
		const id = String(made?.id);
		expect(await post(ladderActions.void, { attempt: id, reason: '' })).toMatchObject({ status: 422 });
		expect(await post(ladderActions.void, { attempt: id, reason: 'wrong profile' })).toBe(
			'/bench/ladders/by-hand'
		);
		expect(await post(ladderActions.void, { attempt: id, reason: 'again' })).toMatchObject({ status: 409 });
		const page = await must(readLadder(ctx, 'by-hand', null));
		expect(page.attempts).toMatchObject([{ voidReason: 'wrong profile' }]);
		expect(page.facts.attempts).toEqual([]);
		expect(page.report.kinds.heaviest.clockMHz).toBeNull();
		const events = await database.db.select().from(auditEvent).where(eq(auditEvent.act, 'attempt.void'));
		expect(events).toMatchObject([{ reason: 'wrong profile', actorId: staff.tester.id }]);
	});

	it('is a tester’s to void', async () => {
		await post(ladderActions.record, one);
		const [made] = await stored();
		const asked = { attempt: made?.id ?? 0, reason: 'no' };
		for (const role of ['writer', 'editor', 'liaison'] as const)
			expect(await voidAttempt({ ...ctx, actor: staff[role] }, 'by-hand', asked)).toMatchObject({
				ok: false,
				reason: 'forbidden'
			});
		expect((await stored())[0]?.voidedAt).toBeNull();
	});
});

describe('a ladder', () => {
	const change = {
		name: 'By hand',
		purpose: '',
		stepMhz: '25',
		limitClockMhz: '4850',
		limitVolts: '1.25',
		limitTempC: '85',
		limitSource: 'our own'
	};

	it('keeps under limits that were changed, and refuses an edit over a newer one', async () => {
		await post(ladderActions.record, one);
		await must(editLadder(ctx, 'by-hand', ladderEdit.parse({ ...change, version: 1 })));
		const { report } = await must(readLadder(ctx, 'by-hand', null));
		// Up from 4800 by four steps of 25 would be 4900; the limit is 4850.
		expect(report.stresses[0]?.next).toMatchObject({ kind: 'try', clockMHz: 4850 });
		const above = await must(readLadder(ctx, 'by-hand', 1.28));
		expect(above.report.stresses[0]?.next).toMatchObject({ kind: 'refused', limit: 'voltage' });
		const late = await editLadder(ctx, 'by-hand', ladderEdit.parse({ ...change, version: 1 }));
		expect(late).toMatchObject({ ok: false, reason: 'conflict' });
	});

	it('takes nothing while it is archived', async () => {
		expect(await post(ladderActions.archive, { archived: 'yes', version: '1' })).toBe(
			'/bench/ladders/by-hand'
		);
		expect(await post(ladderActions.record, one)).toMatchObject({ status: 409 });
		expect(await stored()).toEqual([]);
	});

	it('is begun without scripts, and refused with what was typed', async () => {
		const typed = {
			rig: 'n-12',
			profile: 'stock',
			'stresses.0.workload': 'long-sums',
			'stresses.0.kind': 'heaviest',
			'stresses.0.minutes': '30',
			...change
		};
		expect(await post(newLadder.default, { ...typed, name: 'Second' })).toBe('/bench/ladders/second');
		const wrong = { ...typed, name: 'Third', limitVolts: '9', 'stresses.0.minutes': 'long' };
		expect(await post(newLadder.default, wrong)).toMatchObject({
			status: 422,
			form: {
				data: { name: 'Third', limitVolts: '9', stresses: [{ minutes: 'long' }] },
				errors: { limitVolts: [expect.any(String)], stresses: { 0: { minutes: [expect.any(String)] } } }
			}
		});
		expect((await database.db.select({ n: count() }).from(ladder))[0]?.n).toBe(2);
	});
});

const block = points.map((point) => `${point.threads}\t${point.currentA}\t${point.clockMHz}`).join('\n');
const pass = { key: 'pass-key-0001', points: block, ambientC: '21,5', started: '', notes: '' };

describe('the form of a pass', () => {
	it('stores a pasted block once, and says where it crosses', async () => {
		expect(await post(sweepActions.record, pass)).toBe('/bench/sweeps/where-to-change-over?stored=1');
		expect(await post(sweepActions.record, pass)).toBe('/bench/sweeps/where-to-change-over?stored=1');
		const { passes, report } = await must(readSweep(ctx, 'where-to-change-over'));
		expect(passes).toHaveLength(1);
		expect(passes[0]?.points).toEqual(points);
		expect(report?.point.crossingA).toBeCloseTo(163.3333, 3);
	});

	it('comes back with the line that is wrong, and takes it where a person is sure', async () => {
		const odd = { ...pass, points: `${block}\n32\t190\t5.2` };
		expect(await post(sweepActions.record, odd)).toMatchObject({
			status: 422,
			form: { data: { points: odd.points }, errors: { points: [expect.stringContaining('Line 8')] } }
		});
		expect(await post(sweepActions.record, { ...odd, sure: 'on' })).toContain('stored=1');
	});

	it('is voided with a reason, and its points stay', async () => {
		await post(sweepActions.record, pass);
		const [made] = await database.db.select({ id: sweepPass.id }).from(sweepPass);
		const reason = 'the limit of power cut in';
		expect(await post(sweepActions.void, { pass: String(made?.id), reason })).toBe(
			'/bench/sweeps/where-to-change-over'
		);
		const { passes, report, plate } = await must(readSweep(ctx, 'where-to-change-over'));
		expect(passes).toMatchObject([{ voidReason: reason, points }]);
		expect([report, plate]).toEqual([null, null]);
	});
});
