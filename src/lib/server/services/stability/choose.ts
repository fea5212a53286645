import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Db } from '../../db/client';
import * as plans from '../../db/queries/campaign-plan';

interface Choice {
	id: number;
	slug: string;
}

export type Rig = Awaited<ReturnType<typeof plans.rigChoices>>[number];

const find = <T extends Choice>(rows: readonly T[], ref: string): T | undefined =>
	rows.find((row) => row.slug === ref) ?? rows.find((row) => String(row.id) === ref);

/** The row by slug or id, or the words for its field with the nearest names. */
function choose<T extends Choice>(
	field: string,
	what: string,
	rows: readonly T[],
	ref: string
): Outcome<T, 'invalid'> {
	const row = find(rows, ref);
	if (row) return done(row);
	const near = nearest(
		ref,
		rows.map(({ slug }) => slug)
	);
	const hint = near.length > 0 ? ` Did you mean ${near.join(', ')}?` : '';
	return refuse('invalid', 'Some names are not known. Nothing was stored.', {
		fields: { [field]: [`There is no ${what} “${ref.slice(0, 80)}”.${hint}`] }
	});
}

/** A rig as it stands now, and a profile of it. */
export async function chooseRigAndProfile(
	db: Db,
	refs: { rig: string; profile: string }
): Promise<Outcome<{ rig: Rig; profile: Choice & { name: string } }, 'invalid'>> {
	const rig = choose('rig', 'rig', await plans.rigChoices(db), refs.rig);
	if (!rig.ok) return rig;
	const profiles = await plans.profileChoices(db, rig.value.id);
	const profile = choose('profile', 'profile of this rig', profiles, refs.profile);
	return profile.ok ? done({ rig: rig.value, profile: profile.value }) : profile;
}

/** Workloads by slug or id, in the order given; the field of the first that there is not says so. */
export async function chooseWorkloads(
	db: Db,
	asked: { field: string; ref: string }[]
): Promise<Outcome<Choice[], 'invalid'>> {
	const rows = await plans.workloadChoices(db);
	const chosen: Choice[] = [];
	for (const { field, ref } of asked) {
		const workload = choose(field, 'workload', rows, ref);
		if (!workload.ok) return workload;
		chosen.push(workload.value);
	}
	return done(chosen);
}
