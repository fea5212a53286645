import { createHash } from 'node:crypto';
import { previewImport, type ImportPreview } from '../../../domain/bench/readings-import';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { importLimitBytes } from '../../../schemas/import';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as recorded from '../../db/queries/campaign-readings';
import * as runs from '../../db/queries/run';
import * as settings from '../../db/queries/settings';
import { groupRows, type ImportedRun } from './group-rows';

/** Readings of one cell that a standing run has just so already. */
export interface Double {
	profile: string;
	workload: string;
	run: number;
}

export interface ReadingsPreview extends ImportPreview {
	/** One for each run of the file, or each cell where it numbers no runs. */
	runs: ImportedRun[];
	/** Set when this very file was imported before, and not all of it was voided since. */
	importedBefore: { by: string; at: Date } | null;
	doubles: Double[];
	/** Under which the runs of this file are kept, so that it is taken once. */
	fileKey: string;
	/** How often the file was imported and voided again. */
	attempts: number;
}

/** A file's line ends and its byte-order mark do not make it another file. */
const plain = (text: string): string => text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');

const keyOf = (text: string): string =>
	`csv:${createHash('sha256').update(plain(text).trimEnd()).digest('hex').slice(0, 40)}`;

const same = (values: number[], others: number[]) =>
	values.length === others.length && values.every((value, at) => value === others[at]);

async function findDoubles(ctx: Context, campaignId: number, imported: ImportedRun[]): Promise<Double[]> {
	const all = (await recorded.forCampaigns(ctx.db, [campaignId])).get(campaignId)?.runs ?? [];
	const standing = all.filter((run) => run.voidedAt === null);
	return imported.flatMap(({ profile, workload, readings, voidedReason }) => {
		if (voidedReason !== '') return [];
		const values = readings.map((reading) => reading.value);
		const twin = standing.find(
			(run) =>
				run.profile === profile &&
				run.workload === workload &&
				same(
					values,
					run.readings.map((reading) => reading.value)
				)
		);
		return twin ? [{ profile, workload, run: twin.id }] : [];
	});
}

/** What an import of a file's text into a campaign would do, row by row. Nothing is stored. */
export async function previewReadings(
	ctx: Context,
	plan: CampaignPlan,
	text: string
): Promise<Outcome<ReadingsPreview>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester imports readings.');
	if (Buffer.byteLength(text) > importLimitBytes)
		return refuse(
			'too_large',
			`That is more than ${importLimitBytes / 1e6} MB. Nothing was imported; split the file.`
		);
	if (text.includes('\u0000'))
		return refuse('invalid', 'That is not a text file. Save the sheet as CSV and try again.');
	const { zone } = await settings.publication(ctx.db);
	const preview = previewImport(text, { profiles: plan.profiles, workloads: plan.workloads, zone });
	if (!preview.ok) return preview;
	const fileKey = keyOf(text);
	const before = await runs.withKeyPrefix(ctx.db, plan.head.id, `${fileKey}:`);
	const [stands] = before.filter((run) => run.voidedAt === null);
	const grouped = groupRows(preview.rows);
	return done({
		...preview,
		runs: grouped,
		importedBefore: stands ? { by: stands.tester, at: stands.createdAt } : null,
		doubles: await findDoubles(ctx, plan.head.id, grouped),
		fileKey,
		attempts: before.length
	});
}
