/** What was done, in the words of the history. */
export const actWords: Record<string, string> = {
	'campaign.plan': 'planned the campaign',
	'campaign.edit': 'changed name, date or purpose',
	'campaign.extend': 'added to the plan',
	'campaign.trim': 'removed from the plan',
	'campaign.repeats': 'changed the readings needed',
	'campaign.instrument': 'named what a column is read from',
	'campaign.archive': 'archived it, or took it out again',
	'run.record': 'recorded readings',
	'run.import': 'imported readings',
	'run.edit': 'corrected a run',
	'run.void': 'voided a run',
	'reading.exclude': 'excluded a reading',
	'reading.include': 'took a reading back',
	'cell.sign': 'signed a cell',
	'cell.unsign': 'signature taken off'
};

export interface Change {
	name: string;
	before: string | null;
	after: string | null;
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

/** Longest list of values that is told in full. */
const mostValues = 12;

/** A logged value as text. @example told([1, 2]) // '1, 2' */
export function told(value: unknown): string {
	if (value === null || value === undefined || value === '') return '–';
	if (value === true) return 'yes';
	if (value === false) return 'no';
	if (typeof value === 'number') return String(value);
	if (typeof value === 'string') return value.length > 300 ? `${value.slice(0, 300)}…` : value;
	if (Array.isArray(value)) {
		const shown = value.slice(0, mostValues).map(told).join(', ');
		return value.length > mostValues ? `${shown} and ${value.length - mostValues} more` : shown;
	}
	return JSON.stringify(value).slice(0, 300);
}

const names: Record<string, string> = {
	ambientC: 'ambient, °C',
	startedAt: 'began',
	dueAt: 'due',
	run: 'run',
	reading: 'reading',
	reason: 'reason before'
};

/** Told beside the entry already. */
const aside = new Set(['cell']);

/** What an entry changed, field by field; a field that stayed the same is told once, without a before. */
export function changesOf(before: unknown, after: unknown): Change[] {
	const was = isRecord(before) ? before : {};
	const is = isRecord(after) ? after : {};
	const keys = [...new Set([...Object.keys(was), ...Object.keys(is)])].filter((key) => !aside.has(key));
	return keys.flatMap((key) => {
		const [from, to] = [told(was[key]), told(is[key])];
		if (from === to && from === '–') return [];
		return [
			{
				name: names[key] ?? key,
				before: key in was && from !== to ? from : null,
				after: key in is ? to : null
			}
		];
	});
}

/** The cell an entry is about, profile/workload by slug; empty where it is about the whole campaign. */
export function cellOf(before: unknown, after: unknown): string {
	const cell = isRecord(after) ? after.cell : isRecord(before) ? before.cell : '';
	return typeof cell === 'string' ? cell : '';
}
