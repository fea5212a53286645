import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { nearest } from '../../../domain/shared/nearest';
import type { AttemptForm } from '../../../schemas/ladder';
import type { AttemptInput } from '../../../schemas/stability';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as attempts from '../../db/queries/attempt';
import * as audit from '../../db/queries/audit';
import * as ladders from '../../db/queries/ladder';
import { findLadder } from './find-ladder';
import { readStarted } from './read-started';

export interface RecordedAttempts {
	ladder: string;
	/** Numbers of the attempts sent, in their order, whether this sending brought them or an earlier one. */
	attempts: { id: number; key: string | null }[];
	/** How many of them this sending brought. */
	stored: number;
}

type Stress = Awaited<ReturnType<typeof ladders.stressesOf>>[number];

/** The stress of each row; the fields of those that the ladder does not have. */
function stressesOf(rows: AttemptInput[], stresses: Stress[]): Outcome<Stress[], 'invalid'> {
	const found = rows.map(({ stress }) =>
		stresses.find((one) => one.slug === stress || String(one.workloadId) === stress)
	);
	const fields = Object.fromEntries(
		rows.flatMap(({ stress }, at) => {
			if (found[at]) return [];
			const slugs = stresses.map((one) => one.slug);
			const near = nearest(stress, slugs);
			const names = near.length > 0 ? near : slugs;
			return [
				[
					`attempts.${at}.stress`,
					[`This ladder has no stress “${stress.slice(0, 80)}”. It has ${names.join(', ')}.`]
				]
			];
		})
	);
	if (Object.keys(fields).length > 0)
		return refuse('invalid', 'A stress is not on this ladder. Nothing was stored.', { fields });
	return done(found.filter((one) => one !== undefined));
}

async function write(ctx: Context, ref: string, rows: AttemptInput[]): Promise<Outcome<RecordedAttempts>> {
	const found = await findLadder(ctx, ref);
	if (!found.ok) return found;
	const ladder = await ladders.lock(ctx.db, found.value.id);
	if (!ladder) return refuse('not_found', `There is no ladder “${ref}” on the bench.`);
	const keys = rows.flatMap(({ key }) => key ?? []);
	if (new Set(keys).size < keys.length)
		return refuse('invalid', 'Two attempts carry the same key. Nothing was stored.');
	const before = await attempts.byKeys(ctx.db, ctx.actor.id, keys);
	if (before.some((one) => one.ladderId !== ladder.id))
		return refuse('invalid', 'A key was used on another ladder. Nothing was stored; load the page again.');
	const known = new Map(before.map((one) => [one.clientKey, one.id]));
	const isKnown = ({ key }: AttemptInput) => key !== null && known.has(key);
	const fresh = rows.filter((row) => !isKnown(row));
	if (fresh.length > 0 && ladder.archivedAt)
		return refuse(
			'conflict',
			'This ladder is archived. Nothing was stored; take it out of the archive first.'
		);
	const stresses = stressesOf(rows, await ladders.stressesOf(ctx.db, [ladder.id]));
	if (!stresses.ok) return stresses;
	const ids = await attempts.insertMany(
		ctx.db,
		rows.flatMap((row, at) => {
			const stress = stresses.value[at];
			if (isKnown(row) || !stress) return [];
			const { clockMHz, key, stress: _, startedAt, ...rest } = row;
			return [
				{
					...rest,
					clockMhz: clockMHz,
					ladderId: ladder.id,
					workloadId: stress.workloadId,
					testerId: ctx.actor.id,
					clientKey: key,
					startedAt: startedAt ?? ctx.now,
					createdAt: ctx.now
				}
			];
		})
	);
	if (fresh.length > 0)
		await audit.append(ctx.db, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'attempt.record',
				subjectKind: 'ladder',
				subjectId: ladder.id,
				after: { attempts: fresh.map((row, at) => ({ id: ids[at], ...row })) }
			}
		]);
	const given = ids.values();
	return done({
		ladder: ladder.slug,
		attempts: rows.map((row) => ({
			id: known.get(row.key) ?? given.next().value ?? 0,
			key: row.key
		})),
		stored: fresh.length
	});
}

/** Records attempts of a ladder, all or none; sent again under the same keys, they are stored once. */
export async function recordAttempts(
	ctx: Context,
	ref: string,
	rows: AttemptInput[]
): Promise<Outcome<RecordedAttempts>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester records attempts.');
	return inTransaction(ctx.db, (db) => write({ ...ctx, db }, ref, rows));
}

/** Records one attempt as its form sends it. */
export async function recordAttempt(
	ctx: Context,
	ref: string,
	{ started, ...row }: AttemptForm
): Promise<Outcome<RecordedAttempts>> {
	const time = await readStarted(ctx, started);
	if (!time.ok) return time;
	const recorded = await recordAttempts(ctx, ref, [{ ...row, startedAt: time.value ?? row.startedAt }]);
	if (recorded.ok || !recorded.fields) return recorded;
	const fields = Object.fromEntries(
		Object.entries(recorded.fields).map(([path, words]) => [path.replace('attempts.0.', ''), words])
	);
	return { ...recorded, fields };
}
