import { unitFault } from '../../../domain/bench/unit-fault';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { readingsPerRun, type GridInput } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as readings from '../../db/queries/reading';
import * as runs from '../../db/queries/run';
import * as settings from '../../db/queries/settings';
import { findOpenCell } from './find-open-cell';
import { holdOver } from './hold-over';
import { lockCell } from './lock-cell';
import { readStarted } from './read-started';
import { storeReadings, storeRun } from './store-run';
import type { NamedCell } from './take-signature-off';

export interface GridAnswer {
	/** Null when nothing has been entered in this sitting yet. */
	run: number | null;
	/** What the server now has of the readings sent, whether this sending brought them or an earlier one. */
	stored: { key: string; id: number }[];
	signatureRemoved: boolean;
}

type SittingRun = NonNullable<Awaited<ReturnType<typeof runs.byKey>>>;

const theirs =
	'This sitting belongs to another cell or another campaign. Nothing was stored; load the page again and enter the readings there.';
const voided =
	'The run of this sitting was voided in the meantime. Nothing was stored; load the page again to begin a new run.';

const isOf = (run: SittingRun, cell: NamedCell): boolean =>
	run.campaignId === cell.campaignId &&
	run.profileId === cell.profileId &&
	run.workloadId === cell.workloadId;

/** Brings the circumstances of a sitting up to what was sent last. */
async function amend(ctx: Context, cell: NamedCell, run: SittingRun, input: GridInput): Promise<void> {
	const before = { ambientC: run.ambientC, startedAt: run.startedAt, notes: run.notes };
	const after = { ...before, ambientC: input.ambientC, notes: input.notes };
	if (input.startedAt) after.startedAt = input.startedAt;
	if (JSON.stringify(before) === JSON.stringify(after)) return;
	await runs.update(ctx.db, run.id, run.version, after);
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'run.edit',
			subjectKind: 'campaign',
			subjectId: cell.campaignId,
			before: { cell: cell.name, run: run.id, ...before },
			after: { cell: cell.name, run: run.id, ...after }
		}
	]);
}

/** The sitting's own run; null where the same sitting was begun in another cell in this very moment. */
async function beginRun(ctx: Context, cell: NamedCell, input: GridInput): Promise<number | null> {
	try {
		return await storeRun(ctx, {
			cell,
			source: 'grid',
			clientKey: input.runKey,
			startedAt: input.startedAt ?? ctx.now,
			ambientC: input.ambientC,
			notes: input.notes
		});
	} catch (error) {
		if (isDuplicate(error)) return null;
		throw error;
	}
}

async function record(
	ctx: Context,
	cell: NamedCell,
	needed: number,
	input: GridInput
): Promise<Outcome<GridAnswer>> {
	const existing = await runs.byKey(ctx.db, ctx.actor.id, input.runKey);
	if (existing && !isOf(existing, cell)) return refuse('invalid', theirs);
	if (existing?.voidedAt) return refuse('conflict', voided);
	if (!existing && input.readings.length === 0)
		return done({ run: null, stored: [], signatureRemoved: false });

	const before = existing ? await readings.ofRun(ctx.db, existing.id) : [];
	const known = new Set(before.map((row) => row.clientKey));
	const fresh = input.readings.filter((row) => !known.has(row.key));
	if (before.length + fresh.length > readingsPerRun)
		return refuse(
			'too_large',
			`A run has at most ${readingsPerRun} readings. Nothing of this sending was stored; load the page again to begin a new run.`
		);
	const held = await holdOver(ctx, cell, {
		run: existing?.id ?? null,
		fresh: fresh.length,
		needed,
		othersSeen: input.othersSeen
	});
	if (held) return held;
	if (existing) await amend(ctx, cell, existing, input);
	const run = existing?.id ?? (await beginRun(ctx, cell, input));
	if (run === null) return refuse('invalid', theirs);
	const signatureRemoved = await storeReadings(ctx, cell, run, fresh, before.length + 1);
	const sent = new Set(input.readings.map((row) => row.key));
	const after = await readings.ofRun(ctx.db, run);
	return done({
		run,
		stored: after.flatMap(({ id, clientKey }) =>
			clientKey !== null && sent.has(clientKey) ? [{ key: clientKey, id }] : []
		),
		signatureRemoved
	});
}

/**
 * Takes readings from the entry grid. The run and each reading carry the client's own keys, so that whatever is sent
 * again, after a lost answer or from a second tab, is stored once. What would go over another tester's readings that
 * the sender had not seen is held. Its transaction locks the cell before it reads anything: what it reads then is all
 * that others wrote there.
 */
export async function recordGridReadings(
	ctx: Context,
	campaignRef: string,
	input: GridInput
): Promise<Outcome<GridAnswer>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester enters readings.');
	const at = await findOpenCell(ctx, campaignRef, input);
	if (!at.ok) return at;
	const fault = unitFault(input.unit, at.value.workload);
	if (fault) return refuse('invalid', `${fault} Nothing was stored.`, { fields: { unit: [fault] } });
	if (new Set(input.readings.map((row) => row.key)).size < input.readings.length)
		return refuse('invalid', 'Two readings carry the same key. Nothing was stored.');
	const zone = input.started === '' ? 'UTC' : (await settings.publication(ctx.db)).zone;
	const started = readStarted(input.started, zone);
	if (!started.ok) return started;
	const whole = { ...input, startedAt: started.value ?? input.startedAt };
	return inTransaction(ctx.db, async (db) => {
		const tx = { ...ctx, db };
		const cell = await lockCell(tx, at.value.campaignId, at.value);
		return cell.ok ? record(tx, cell.value, at.value.workload.needed, whole) : cell;
	});
}
