import { readingsHeader, readingsLines, type ExportedReading } from '../../../domain/bench/readings-writer';
import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as exported from '../../db/queries/campaign-export';
import { findCampaign } from './find-campaign';

/** Runs read at a time: the whole of a large campaign is never held at once. */
const runsAtATime = 200;

async function* linesOf(ctx: Context, campaignId: number): AsyncGenerator<string> {
	yield readingsHeader();
	let [after, number] = [0, 0];
	for (;;) {
		const runs = await exported.runsAfter(ctx.db, campaignId, after, runsAtATime);
		if (runs.length === 0) return;
		const ids = runs.map((run) => run.id);
		const readings = grouped(await exported.readingsOf(ctx.db, ids), (reading) => reading.runId);
		const rows = runs.flatMap(({ id, voidReason, ...run }): ExportedReading[] => {
			number += 1;
			return (readings.get(id) ?? []).map(({ value, excludeReason }, at) => ({
				...run,
				run: number,
				repeat: at + 1,
				value,
				excludedReason: excludeReason,
				voidedReason: voidReason
			}));
		});
		yield readingsLines(rows);
		after = ids.at(-1) ?? after;
	}
}

export interface ReadingsExport {
	/** The campaign's slug. */
	slug: string;
	/** The file, piece by piece. */
	text: AsyncGenerator<string>;
}

/** Every reading of a campaign as CSV, excluded and voided ones too, in a form that the import takes back. */
export async function exportReadings(ctx: Context, campaignRef: string): Promise<Outcome<ReadingsExport>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { id, slug } = found.value.head;
	return done({ slug, text: linesOf(ctx, id) });
}
