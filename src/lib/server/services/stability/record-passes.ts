import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SweepPassInput } from '../../../schemas/stability';
import type { PassForm } from '../../../schemas/sweep';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as sweeps from '../../db/queries/sweep';
import * as passes from '../../db/queries/sweep-pass';
import { findSweep } from './find-sweep';
import { readStarted } from './read-started';

export interface RecordedPasses {
	sweep: string;
	/** The passes sent, in their order, whether this sending brought them or an earlier one. */
	passes: { id: number; number: number; key: string | null }[];
	/** How many of them this sending brought. */
	stored: number;
}

async function store(ctx: Context, sweepId: number, pass: SweepPassInput) {
	const { points, ambientC, startedAt, notes, key } = pass;
	const number = await passes.nextNumber(ctx.db, sweepId);
	const row = {
		sweepId,
		number,
		testerId: ctx.actor.id,
		clientKey: key,
		startedAt: startedAt ?? ctx.now,
		ambientC,
		notes,
		createdAt: ctx.now
	};
	const id = await passes.insert(
		ctx.db,
		row,
		points.map(({ threads, currentA, clockMHz }) => ({ threads, currentA, clockMhz: clockMHz }))
	);
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'sweep.pass',
			subjectKind: 'sweep',
			subjectId: sweepId,
			after: { pass: number, points, ambientC, notes }
		}
	]);
	return { id, number, key };
}

async function write(ctx: Context, ref: string, sent: SweepPassInput[]): Promise<Outcome<RecordedPasses>> {
	const found = await findSweep(ctx, ref);
	if (!found.ok) return found;
	const sweep = await sweeps.lock(ctx.db, found.value.id);
	if (!sweep) return refuse('not_found', `There is no sweep “${ref}” on the bench.`);
	const keys = sent.flatMap(({ key }) => key ?? []);
	if (new Set(keys).size < keys.length)
		return refuse('invalid', 'Two passes carry the same key. Nothing was stored.');
	const known = new Map(
		await Promise.all(keys.map(async (key) => [key, await passes.byKey(ctx.db, ctx.actor.id, key)] as const))
	);
	if ([...known.values()].some((pass) => pass && pass.sweepId !== sweep.id))
		return refuse('invalid', 'A key was used on another sweep. Nothing was stored; load the page again.');
	const isKnown = ({ key }: SweepPassInput) => (key === null ? undefined : known.get(key));
	const fresh = sent.filter((pass) => !isKnown(pass)).length;
	if (fresh > 0 && sweep.archivedAt)
		return refuse(
			'conflict',
			'This sweep is archived. Nothing was stored; take it out of the archive first.'
		);
	const answer: RecordedPasses['passes'] = [];
	for (const pass of sent) {
		const before = isKnown(pass);
		answer.push(
			before ? { id: before.id, number: before.number, key: pass.key } : await store(ctx, sweep.id, pass)
		);
	}
	return done({ sweep: sweep.slug, passes: answer, stored: fresh });
}

/** Records passes of a sweep, all or none; sent again under the same keys, they are stored once. */
export async function recordPasses(
	ctx: Context,
	ref: string,
	sent: SweepPassInput[]
): Promise<Outcome<RecordedPasses>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester records passes.');
	return inTransaction(ctx.db, (db) => write({ ...ctx, db }, ref, sent));
}

/** Records one pass as its form sends it. */
export async function recordPass(
	ctx: Context,
	ref: string,
	{ started, ...pass }: PassForm
): Promise<Outcome<RecordedPasses>> {
	const time = await readStarted(ctx, started);
	if (!time.ok) return time;
	return recordPasses(ctx, ref, [{ ...pass, startedAt: time.value ?? pass.startedAt }]);
}
