import { suggestMeaning, type MeaningSuggestion } from '../../../domain/bench/tuning/suggest-meaning';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as meanings from '../../db/queries/firmware-meaning';

/** Most settings without a meaning that are offered at once. */
const mostOffered = 200;

export interface MeaningList {
	rows: Awaited<ReturnType<typeof meanings.list>>;
	families: string[];
	/** Settings in profiles that nothing explains, with what their name suggests: a guess, for a tester to judge. */
	unexplained: { family: string; setting: string; n: number; suggestion: MeaningSuggestion | null }[];
}

/** What is written down of what the firmware's settings set, and what is not yet. */
export async function listMeanings(
	ctx: Context,
	{ family }: { family: string }
): Promise<Outcome<MeaningList, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, families, unexplained] = await Promise.all([
		meanings.list(ctx.db, family),
		meanings.families(ctx.db),
		meanings.unexplained(ctx.db, mostOffered)
	]);
	return done({
		rows,
		families,
		unexplained: unexplained
			.filter((row) => family === '' || row.family === family)
			.map((row) => ({ ...row, suggestion: suggestMeaning(row.setting) }))
	});
}
