/** Rows of one list that a plain form may send. */
const maxRows = 1000;

type Branch = Map<string, Branch | FormDataEntryValue>;

const safeKey = /^(?!__proto__$|constructor$|prototype$)\w+$/;

/** Rows become arrays in the order of their numbers; the rest become plain objects. */
function plain(branch: Branch): unknown {
	const entries = [...branch].map(
		([key, value]) => [key, value instanceof Map ? plain(value) : value] as const
	);
	if (entries.length === 0 || !entries.every(([key]) => /^\d+$/.test(key)))
		return Object.fromEntries(entries);
	return entries
		.sort(([a], [b]) => Number(a) - Number(b))
		.slice(0, maxRows)
		.map(([, value]) => value);
}

/**
 * The object that a form without scripts means by its flat names: 'settings.0.value' is a field of a row,
 * 'samples[]' one of several choices.
 */
export function nestFields(posted: FormData): Record<string, unknown> {
	const root: Branch = new Map();
	const lists: Record<string, FormDataEntryValue[]> = {};
	for (const [name, value] of posted) {
		if (name.endsWith('[]')) {
			const key = name.slice(0, -2);
			if (safeKey.test(key)) (lists[key] ??= []).push(value);
			continue;
		}
		const path = name.split('.');
		const leaf = path.pop();
		if (leaf === undefined || ![...path, leaf].every((key) => safeKey.test(key))) continue;
		let branch = root;
		for (const key of path) {
			const next = branch.get(key);
			const child: Branch = next instanceof Map ? next : new Map();
			branch.set(key, child);
			branch = child;
		}
		branch.set(leaf, value);
	}
	return { ...(plain(root) as Record<string, unknown>), ...lists };
}
