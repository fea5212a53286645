import type { CampaignData } from '../../../domain/articles/data';
import type { MeasuredCampaign } from './read-campaign';

/** The campaign as a plate takes it: its parts with their prices, without the settings of its profiles. */
export function campaignAsData(
	{ plan: { head, profiles, workloads }, matrix, figures }: MeasuredCampaign,
	kit: CampaignData['kit'] = []
): CampaignData {
	return {
		slug: head.slug,
		name: head.name,
		rig: {
			slug: head.rigSlug,
			name: head.rigName,
			revision: head.revision,
			firmware: head.firmware,
			driver: head.driver,
			os: head.os
		},
		kit,
		profiles: profiles.map(({ slug, name, notes }) => ({
			slug,
			name,
			parent: null,
			notes,
			settings: [],
			derived: []
		})),
		workloads,
		baseline: matrix.baseline,
		cells: figures.cells,
		overall: figures.overall
	};
}
