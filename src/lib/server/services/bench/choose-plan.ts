import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type FieldErrors, type Outcome } from '../../../domain/shared/outcome';
import type { Db } from '../../db/client';
import * as plans from '../../db/queries/campaign-plan';
import * as instruments from '../../db/queries/instrument';

type Choice = { id: number; slug: string };

export interface ChosenRows {
	profileIds: number[];
	workloads: { workloadId: number; repeats: number; instrumentId: number | null }[];
}

interface Asked {
	profiles: string[];
	workloads: { workload: string; repeats: number | null; instrument?: string }[];
}

const find = <T extends Choice>(rows: readonly T[], ref: string): T | undefined =>
	rows.find((row) => row.slug === ref) ?? rows.find((row) => String(row.id) === ref);

function unknown(kind: string, refs: string[], rows: readonly Choice[]): string[] {
	return refs.map((ref) => {
		const near = nearest(
			ref,
			rows.map((row) => row.slug)
		);
		const hint = near.length > 0 ? ` Did you mean ${near.join(', ')}?` : '';
		return `There is no ${kind} “${ref.slice(0, 80)}”.${hint}`;
	});
}

/** The rig of a plan by slug or id, as it stands now. */
export async function chooseRig(db: Db, ref: string) {
	const rigs = await plans.rigChoices(db);
	const rig = find(rigs, ref);
	if (rig) return done(rig);
	const fields = { rig: unknown('rig', [ref], rigs) };
	return refuse('invalid', 'Choose another rig. Nothing was stored.', { fields });
}

/** The instruments that lines name: those there are not, and those out of use, are told beside the workloads. */
async function chooseInstruments(db: Db, asked: Asked['workloads']) {
	const refs = [...new Set(asked.flatMap((row) => row.instrument || []))];
	const found = await instruments.byRefs(db, refs);
	const errors = refs.flatMap((ref) => {
		const one = find(found, ref);
		if (!one) return [`There is no instrument “${ref}” in the lab.`];
		return one.retiredAt ? [`${one.name} is no longer in use. Name another, or the program itself.`] : [];
	});
	return { found, errors };
}

/**
 * Profiles of a rig, and workloads with their repeats and instruments, by slug or id; what there is not comes back by
 * field.
 */
export async function chooseRows(
	db: Db,
	rigId: number,
	input: Asked
): Promise<Outcome<ChosenRows, 'invalid'>> {
	const [profiles, workloads, named] = await Promise.all([
		plans.profileChoices(db, rigId),
		plans.workloadChoices(db),
		chooseInstruments(db, input.workloads)
	]);
	const fields: FieldErrors = {};
	const strayProfiles = input.profiles.filter((ref) => !find(profiles, ref));
	if (strayProfiles.length > 0) fields.profiles = unknown('profile of this rig', strayProfiles, profiles);
	const strayWorkloads = input.workloads.map((row) => row.workload).filter((ref) => !find(workloads, ref));
	const wrong = [...unknown('workload', strayWorkloads, workloads), ...named.errors];
	if (wrong.length > 0) fields.workloads = wrong;
	if (Object.keys(fields).length > 0)
		return refuse('invalid', 'Some of what is named cannot be used. Nothing was stored.', { fields });
	return done({
		profileIds: input.profiles.flatMap((ref) => find(profiles, ref)?.id ?? []),
		workloads: input.workloads.flatMap((row) => {
			const found = find(workloads, row.workload);
			const instrumentId = (row.instrument && find(named.found, row.instrument)?.id) || null;
			return found ? [{ workloadId: found.id, repeats: row.repeats ?? found.repeats, instrumentId }] : [];
		})
	});
}
