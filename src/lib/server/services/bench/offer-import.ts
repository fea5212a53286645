import { may } from '../../../domain/people/policy';
import type { PreviewRow } from '../../../domain/bench/readings-import';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';
import { findOpenCampaign } from './find-campaign';
import { previewReadings, type Double } from './preview-readings';

export interface ImportOffer {
	slug: string;
	name: string;
	profiles: { slug: string; name: string }[];
	workloads: { slug: string; name: string; unit: string }[];
	zone: string;
}

/** What the page of an import tells before a file is chosen: the names a file may use. */
export async function offerImport(ctx: Context, campaignRef: string): Promise<Outcome<ImportOffer>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester imports readings.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { head, profiles, workloads } = found.value;
	const { zone } = await settings.publication(ctx.db);
	return done({
		slug: head.slug,
		name: head.name,
		profiles: profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: workloads.map(({ slug, name, unit }) => ({ slug, name, unit })),
		zone
	});
}

export interface FilePreview {
	rows: PreviewRow[];
	taken: number;
	refused: number;
	runs: number;
	ignored: string[];
	importedBefore: { by: string; at: Date } | null;
	doubles: Double[];
}

/** What an import of a file's text would do, for the page that asks whether to. */
export async function previewFile(
	ctx: Context,
	campaignRef: string,
	text: string
): Promise<Outcome<FilePreview>> {
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const preview = await previewReadings(ctx, found.value, text);
	if (!preview.ok) return preview;
	const { rows, taken, refused, runs, ignored, importedBefore, doubles } = preview.value;
	return done({ rows, taken, refused, runs: runs.length, ignored, importedBefore, doubles });
}
