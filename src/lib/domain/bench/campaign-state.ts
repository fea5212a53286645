export const campaignStates = ['planned', 'running', 'signed', 'archived'] as const;

/** Where a campaign stands: nothing run, under way, every cell signed off, put away. */
export type CampaignState = (typeof campaignStates)[number];

export const campaignStateWords: Record<CampaignState, string> = {
	planned: 'planned',
	running: 'running',
	signed: 'signed off',
	archived: 'archived'
};

/** The state of a campaign from what is counted of it; the same rule as the list's filter. */
export function campaignState(counted: {
	archived: boolean;
	runs: number;
	cells: number;
	signed: number;
}): CampaignState {
	if (counted.archived) return 'archived';
	if (counted.signed > 0 && counted.signed === counted.cells) return 'signed';
	return counted.runs > 0 ? 'running' : 'planned';
}
