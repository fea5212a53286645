import { unitFault } from '../../../domain/bench/unit-fault';
import { may } from '../../../domain/people/policy';
import type { Summary } from '../../../domain/bench/figures';
import { summarise } from '../../../domain/bench/statistics/summary';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RunInput } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as readings from '../../db/queries/reading';
import { doubtReadings } from './doubt-readings';
import { findOpenCampaign } from './find-campaign';
import { findCell } from './find-cell';
import { lockCell } from './lock-cell';
import { storeReadings, storeRun } from './store-run';

export interface RecordedRun {
	id: number;
	campaign: string;
	profile: string;
	workload: string;
	unit: string;
	readings: { id: number; value: number }[];
	/** The cell as it stands now, with all its runs. */
	summary: Summary | null;
	signatureRemoved: boolean;
	/** Readings that stand so far from the others that a unit may be wrong; they are stored all the same. */
	warnings: string[];
}

/** Records one run of a cell as a script sends it. */
export async function recordRun(
	ctx: Context,
	campaignRef: string,
	input: RunInput
): Promise<Outcome<RecordedRun>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester records runs.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const plan = found.value;
	const at = findCell(plan, input);
	if (!at.ok) return at;
	const { profile, workload } = at.value;
	const fault = unitFault(input.unit, workload);
	if (fault) return refuse('invalid', `${fault} Nothing was stored.`, { fields: { unit: [fault] } });

	const warnings = await doubtReadings(ctx, plan, at.value, input.readings);
	return inTransaction(ctx.db, async (db) => {
		const tx = { ...ctx, db };
		const locked = await lockCell(tx, plan.head.id, at.value);
		if (!locked.ok) return locked;
		const cell = locked.value;
		const id = await storeRun(tx, {
			cell,
			source: 'api',
			clientKey: null,
			startedAt: input.startedAt ?? ctx.now,
			ambientC: input.ambientC,
			notes: input.notes
		});
		const fresh = input.readings.map((value) => ({ value, key: null }));
		const signatureRemoved = await storeReadings(tx, cell, id, fresh, 1);
		const stored = await readings.ofRun(db, id);
		const counted = await readings.countedOfCellNow(db, cell);
		return done({
			id,
			campaign: plan.head.slug,
			profile: profile.slug,
			workload: workload.slug,
			unit: workload.unit,
			readings: stored.map((row) => ({ id: row.id, value: row.value })),
			summary: summarise(
				counted.map((row) => row.value),
				workload.headline
			),
			signatureRemoved,
			warnings
		});
	});
}
