import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Db } from '../../db/client';
import * as samples from '../../db/queries/sample';

/** The ids of the samples that a rig names, in its order; refused beside the field when one is not in the stores or named twice. */
export async function sampleIdsOf(db: Db, refs: string[]): Promise<Outcome<number[], 'invalid'>> {
	const found = await samples.byRefs(db, refs);
	const idOf = new Map(
		found.flatMap((row) => [[row.slug, row.id] as const, [String(row.id), row.id] as const])
	);
	const missing = refs.filter((ref) => !idOf.has(ref));
	const wrong = (message: string) =>
		refuse('invalid', 'Nothing was saved: look at the samples.', { fields: { samples: [message] } });
	if (missing.length > 0)
		return wrong(`There is no sample ${missing.map((ref) => `“${ref}”`).join(', ')} in the stores.`);
	const ids = refs.flatMap((ref) => idOf.get(ref) ?? []);
	if (new Set(ids).size < ids.length) return wrong('A sample is in a rig once.');
	return done(ids);
}
