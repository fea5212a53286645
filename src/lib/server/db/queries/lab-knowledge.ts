import type { LabKnowledge } from '../../../domain/bench/tuning/lab-reading';
import type { Db } from '../client';
import * as meanings from './firmware-meaning';
import * as limits from './lab-limit';
import * as rigs from './rig';
import * as revisions from './rig-revision';

/**
 * What the lab knows of several rigs, by their ids: the meanings of each firmware family, the lab's limits, and the
 * kinds of the parts in each as it stands now. Four queries however many.
 */
export async function ofRigs(db: Db, rigIds: number[]): Promise<(rigId: number) => LabKnowledge> {
	const found = await rigs.byRefs(db, rigIds.map(String));
	const families = [...new Set(found.map((rig) => rig.firmwareFamily))].filter((family) => family !== '');
	const [entries, limitRows, units] = await Promise.all([
		meanings.ofFamilies(db, families),
		limits.list(db),
		revisions.samplesOf(
			db,
			found.map((rig) => rig.revisionId)
		)
	]);
	const known = limitRows.map(({ quantity, partKind, limit, unit, source }) => ({
		quantity,
		partKind,
		limit,
		unit,
		source
	}));
	return (rigId) => {
		const rig = found.find((one) => one.id === rigId);
		const family = rig?.firmwareFamily ?? '';
		return {
			family,
			meanings: entries.filter((entry) => entry.family.toLowerCase() === family.toLowerCase()),
			limits: known,
			kinds: [
				...new Set(units.filter((unit) => unit.revisionId === rig?.revisionId).map((unit) => unit.kind))
			]
		};
	};
}
