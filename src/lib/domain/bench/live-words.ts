/** Something that happened in a campaign, as a board is told of it. */
export interface BoardChange {
	/** Of the entry in the history. */
	id: number;
	who: string;
	/** Whether the watcher did it, here or in another window. */
	mine: boolean;
	act: string;
	/** profile/workload by slug; empty where it is about the whole campaign. */
	cell: string;
	/** Readings it brought. */
	readings: number;
}

interface Named {
	slug: string;
	name: string;
}

const readingsWords = (n: number): string => (n === 1 ? '1 reading' : `${n} readings`);

const words: Record<string, (n: number) => string> = {
	'run.record': (n) => `entered ${readingsWords(n)}`,
	'run.import': (n) => `imported ${readingsWords(n)}`,
	'run.edit': () => 'corrected a run',
	'run.void': () => 'voided a run',
	'reading.exclude': () => 'excluded a reading',
	'reading.include': () => 'took a reading back',
	'cell.sign': () => 'signed',
	'cell.unsign': () => 'took the signature off'
};
const elsewhere = 'changed the plan';
const nameOf = (rows: readonly Named[], slug: string): string =>
	rows.find((row) => row.slug === slug)?.name ?? slug;

function sentence(change: BoardChange, names: { profiles: readonly Named[]; workloads: readonly Named[] }) {
	const did = words[change.act]?.(change.readings) ?? elsewhere;
	if (change.cell === '') return `${change.who} ${did}.`;
	const [profile = '', workload = ''] = change.cell.split('/');
	const place = `${nameOf(names.profiles, profile)} · ${nameOf(names.workloads, workload)}`;
	const link = change.act === 'cell.sign' ? ' ' : change.act === 'cell.unsign' ? ' ' : ' in ';
	return `${change.who} ${did}${link}${place}.`;
}

/**
 * What others changed, a sentence each, the newest first. Readings of one person in one cell are told together.
 * @example changeWords(changes, board) // ['Pelle entered 2 readings in Stock · Tile render.']
 */
export function changeWords(
	changes: readonly BoardChange[],
	names: { profiles: readonly Named[]; workloads: readonly Named[] },
	most = 3
): string[] {
	const told = new Map<string, BoardChange>();
	for (const change of changes) {
		if (change.mine) continue;
		const key = `${change.who}\n${change.act}\n${change.cell}`;
		const before = told.get(key);
		told.delete(key);
		told.set(key, { ...change, readings: change.readings + (before?.readings ?? 0) });
	}
	return [...told.values()]
		.slice(-most)
		.reverse()
		.map((change) => sentence(change, names));
}
