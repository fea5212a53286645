import { gainsSpec } from '../../../domain/articles/plates/gains-spec';
import { overallSpec } from '../../../domain/articles/plates/overall-spec';
import type { PlateSpec } from '../../../domain/articles/plates/spec';
import { countedReadings } from '../../../domain/bench/campaign';
import { cellUncertainty } from '../../../domain/bench/cell-uncertainty';
import type { CampaignComparison } from '../../../domain/bench/comparison-csv';
import { cellNotes } from '../../../domain/bench/comparison-notes';
import type { CellOff } from '../../../domain/bench/drift-facts';
import { comparedTogether } from '../../../domain/bench/held-against';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import { campaignAsData } from './campaign-as-data';
import { readCampaign, type MeasuredCampaign } from './read-campaign';
import { campaignOff } from './rig-off';

function comparisonOf(
	{ plan, matrix, figures }: MeasuredCampaign,
	off: readonly CellOff[]
): CampaignComparison {
	const { baseline } = matrix;
	const together = comparedTogether(figures.cells);
	const cells = figures.cells.flatMap((cell) => {
		const workload = plan.workloads.find((row) => row.slug === cell.workload);
		if (!workload) return [];
		const against = figures.cells.find(
			(one) => one.profile === baseline && one.workload === cell.workload
		)?.summary;
		const values = countedReadings(
			matrix.runs.filter((run) => run.profile === cell.profile && run.workload === cell.workload)
		).map((reading) => reading.value);
		const held = cell.profile === baseline ? null : (against ?? null);
		const moved = off.find((one) => one.profile === cell.profile && one.workload === cell.workload);
		const uncertainty =
			cell.summary && workload.instrument
				? cellUncertainty(cell.summary, workload.unit, workload.instrument, (cell.to ?? '').slice(0, 10))
				: null;
		const notes = cellNotes(cell, values, held, workload, together);
		return [{ ...cell, notes: { ...notes, off: moved?.words ?? null, uncertainty } }];
	});
	return {
		campaign: plan.head.slug,
		name: plan.head.name,
		baseline,
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: plan.workloads,
		cells,
		together,
		overall: figures.overall
	};
}

function platesOf(measured: MeasuredCampaign, zone: string): PlateSpec[] {
	const data = campaignAsData(measured);
	const over = data.profiles.find((one) => one.slug === data.baseline);
	return over
		? [gainsSpec(data, over, { zone }), overallSpec(data, over, { zone })].filter((one) => one !== null)
		: [];
}

/** Every profile of a campaign against one of them, workload by workload and overall. */
export async function readComparison(
	ctx: Context,
	campaignRef: string,
	baseline: string | null
): Promise<Outcome<CampaignComparison & { plates: PlateSpec[] }>> {
	const read = await readCampaign(ctx, campaignRef, baseline);
	if (!read.ok) return read;
	const [off, { zone }] = await Promise.all([campaignOff(ctx, read.value), settings.publication(ctx.db)]);
	return done({ ...comparisonOf(read.value, off), plates: platesOf(read.value, zone) });
}
