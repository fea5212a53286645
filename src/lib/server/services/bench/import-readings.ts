import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { readingsPerRun } from '../../../schemas/run';
import type { ImportInput } from '../../../schemas/import';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as plans from '../../db/queries/campaign-plan';
import * as readings from '../../db/queries/reading';
import * as runs from '../../db/queries/run';
import { findOpenCampaign } from './find-campaign';
import type { ImportedRun } from './group-rows';
import { previewReadings, type ReadingsPreview } from './preview-readings';
import { takeSignaturesOff } from './take-signature-off';

export interface Imported {
	readings: number;
	runs: number;
	/** Rows left in the file. */
	left: number;
	signaturesRemoved: number;
}

const again = (by: string) =>
	refuse(
		'conflict',
		`This file was imported before, by ${by}. Nothing was imported twice; void its runs first if it must be taken anew.`
	);

function refuseWhole(preview: ReadingsPreview, leaveRefused: boolean): Outcome<never> | null {
	if (preview.importedBefore) return again(preview.importedBefore.by);
	if (preview.taken === 0) return refuse('invalid', 'None of the rows can be taken. Nothing was imported.');
	if (preview.refused > 0 && !leaveRefused)
		return refuse(
			'invalid',
			`${preview.refused} of ${preview.rows.length} rows are refused, so nothing was imported. Mend them in the file, or say that the others are to be taken without them.`
		);
	const long = preview.runs.find((run) => run.readings.length > readingsPerRun);
	if (long)
		return refuse(
			'too_large',
			`${long.profile}, ${long.workload} has ${long.readings.length} readings; a run has at most ${readingsPerRun}. Nothing was imported; split the file.`
		);
	return null;
}

const cellOf = (plan: CampaignPlan, run: ImportedRun) => ({
	campaignId: plan.head.id,
	profileId: plan.profiles.find((row) => row.slug === run.profile)?.id ?? 0,
	workloadId: plan.workloads.find((row) => row.slug === run.workload)?.id ?? 0,
	name: `${run.profile}/${run.workload}`
});

/** A run for the history: what the file says of who took it, and of what does not count. */
function told(run: ImportedRun) {
	const excluded = run.readings.flatMap(({ excludedReason }, at) =>
		excludedReason === '' ? [] : [`reading ${at + 1}: ${excludedReason}`]
	);
	return {
		readings: run.readings.map((reading) => reading.value),
		...(run.tester !== '' && { 'taken by': run.tester }),
		...(run.source !== '' && { 'came by': run.source }),
		...(excluded.length > 0 && { excluded }),
		...(run.voidedReason !== '' && { voided: run.voidedReason })
	};
}

async function store(ctx: Context, plan: CampaignPlan, preview: ReadingsPreview): Promise<Imported> {
	const cells = preview.runs.map((run, at) => {
		const cell = cellOf(plan, run);
		return { run, cell, clientKey: `${preview.fileKey}:${at + 1}:${preview.attempts}` };
	});
	await plans.lockCells(
		ctx.db,
		plan.head.id,
		[...new Set(cells.map(({ cell }) => cell.profileId))],
		[...new Set(cells.map(({ cell }) => cell.workloadId))]
	);
	const ids = await runs.insertMany(
		ctx.db,
		ctx.actor.id,
		cells.map(({ run, cell: { name: _name, ...cell }, clientKey }) => ({
			...cell,
			source: 'csv',
			clientKey,
			startedAt: run.startedAt === null ? ctx.now : new Date(run.startedAt),
			ambientC: run.ambientC,
			notes: run.notes,
			createdAt: ctx.now,
			...(run.voidedReason !== '' && {
				voidedAt: ctx.now,
				voidedBy: ctx.actor.id,
				voidReason: run.voidedReason
			})
		}))
	);
	await readings.insertMany(
		ctx.db,
		cells.flatMap(({ run, clientKey }) =>
			run.readings.map(({ value, excludedReason }, at) => ({
				runId: ids.get(clientKey) ?? 0,
				position: at + 1,
				value,
				createdAt: ctx.now,
				...(excludedReason !== '' && {
					excludedAt: ctx.now,
					excludedBy: ctx.actor.id,
					excludeReason: excludedReason
				})
			}))
		)
	);
	await audit.append(
		ctx.db,
		cells.map(({ run, cell, clientKey }) => ({
			at: ctx.now,
			actorId: ctx.actor.id,
			act: 'run.import',
			subjectKind: 'campaign',
			subjectId: plan.head.id,
			after: { cell: cell.name, run: ids.get(clientKey), ...told(run) }
		}))
	);
	const signaturesRemoved = await takeSignaturesOff(
		ctx,
		cells.map(({ cell }) => cell),
		'Readings were imported after the signature.'
	);
	return { readings: preview.taken, runs: ids.size, left: preview.refused, signaturesRemoved };
}

/**
 * Imports a file's readings: the runs it numbers, or one for each cell, all in one transaction; what the file says is
 * excluded or voided is so, with its reason. The preview is made anew from the text,
 * and whatever it refuses stops the import unless the person said to leave those rows.
 */
export async function importReadings(
	ctx: Context,
	campaignRef: string,
	input: ImportInput
): Promise<Outcome<Imported>> {
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const plan = found.value;
	const preview = await previewReadings(ctx, plan, input.text);
	if (!preview.ok) return preview;
	const refused = refuseWhole(preview.value, input.leaveRefused);
	if (refused) return refused;
	try {
		return done(await inTransaction(ctx.db, (db) => store({ ...ctx, db }, plan, preview.value)));
	} catch (error) {
		if (isDuplicate(error)) return again('you, just now');
		throw error;
	}
}
