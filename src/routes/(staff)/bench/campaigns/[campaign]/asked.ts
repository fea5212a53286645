import type { ReasonedAct } from '$lib/components/bench/acts';
import type { CellRun } from '$lib/domain/bench/cell-runs';

/** A question the page asks before it does something: for a reason, or for a run's circumstances. */
export type Asked = { act: ReasonedAct; id: number } | { act: 'edit'; run: CellRun };

/** What goes along with the answer. */
export function hiddenOf(
	asked: Exclude<Asked, { act: 'edit' }>,
	cell: { profile: string; workload: string }
): Record<string, string | number> {
	if (asked.act === 'unsign') return { profile: cell.profile, workload: cell.workload };
	return asked.act === 'void' ? { run: asked.id } : { reading: asked.id };
}

/** The question that an address names, for browsers without scripts; null for none. */
export function askedBy(params: URLSearchParams, runs: CellRun[]): Asked | null {
	const act = params.get('ask');
	const id = Number(params.get('id'));
	if (act === 'unsign') return { act, id: 0 };
	if (act === 'void' || act === 'edit') {
		const run = runs.find((one) => one.id === id && one.voided === null);
		if (!run) return null;
		return act === 'edit' ? { act, run } : { act, id };
	}
	if (act !== 'exclude' && act !== 'include') return null;
	return runs.some((run) => run.readings.some((reading) => reading.id === id)) ? { act, id } : null;
}
