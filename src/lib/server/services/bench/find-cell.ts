import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type Outcome, type FieldErrors } from '../../../domain/shared/outcome';
import type { CampaignPlan, CampaignProfileRow, CampaignWorkloadRow } from '../../db/queries/campaign-facts';

/** A cell of a plan: one of its profiles and one of its workloads. */
export interface FoundCell {
	profile: CampaignProfileRow;
	workload: CampaignWorkloadRow;
}

/** How the history and the page call a cell. */
export const cellName = (cell: { profile: { slug: string }; workload: { slug: string } }): string =>
	`${cell.profile.slug}/${cell.workload.slug}`;

const find = <T extends { id: number; slug: string }>(rows: readonly T[], ref: string): T | undefined =>
	rows.find((row) => row.slug === ref) ?? rows.find((row) => String(row.id) === ref);

function missing(kind: string, ref: string, rows: readonly { slug: string }[]): string {
	const slugs = rows.map((row) => row.slug);
	const near = nearest(ref, slugs);
	const offer =
		near.length > 0 ? `Did you mean ${near.join(', ')}?` : `It has ${slugs.slice(0, 8).join(', ')}.`;
	return `This campaign has no ${kind} “${ref.slice(0, 80)}”. ${offer}`;
}

/** The profile and workload of a plan by slug or id; what it does not have comes back with the nearest names. */
export function findCell(
	plan: CampaignPlan,
	refs: { profile: string; workload: string }
): Outcome<FoundCell, 'invalid'> {
	const profile = find(plan.profiles, refs.profile);
	const workload = find(plan.workloads, refs.workload);
	if (profile && workload) return done({ profile, workload });
	const fields: FieldErrors = {};
	if (!profile) fields.profile = [missing('profile', refs.profile, plan.profiles)];
	if (!workload) fields.workload = [missing('workload', refs.workload, plan.workloads)];
	return refuse('invalid', `${Object.values(fields).flat().join(' ')} Nothing was stored.`, { fields });
}

/** As findCell, of several; refused whole at the first that the plan does not have. */
export function findCells(
	plan: CampaignPlan,
	refs: readonly { profile: string; workload: string }[]
): Outcome<FoundCell[], 'invalid'> {
	const cells: FoundCell[] = [];
	for (const ref of refs) {
		const found = findCell(plan, ref);
		if (!found.ok) return found;
		cells.push(found.value);
	}
	return done(cells);
}
