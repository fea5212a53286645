export interface FieldChange {
	field: string;
	/** Absent where there was nothing. */
	before?: string;
	after?: string;
}

const longest = 160;

function inWords(value: unknown): string | undefined {
	if (value === undefined || value === null || value === '') return undefined;
	if (Array.isArray(value) && value.every((item) => typeof item !== 'object'))
		return value.join(', ') || undefined;
	const text = typeof value === 'object' ? JSON.stringify(value) : String(value);
	return text.length > longest ? `${text.slice(0, longest)}…` : text;
}

const fieldsOf = (value: unknown): Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value)
		? (value as Record<string, unknown>)
		: value === undefined || value === null
			? {}
			: { value };

/**
 * What an entry of the audit log changed, field by field; what stayed the same is left out.
 * @example changesOf({ roles: ['tester'] }, { roles: ['tester', 'admin'] }) // [{ field: 'roles', before: 'tester', after: 'tester, admin' }]
 */
export function changesOf(before: unknown, after: unknown): FieldChange[] {
	const [old, now] = [fieldsOf(before), fieldsOf(after)];
	const names = [...new Set([...Object.keys(old), ...Object.keys(now)])];
	return names
		.map((field) => ({ field, before: inWords(old[field]), after: inWords(now[field]) }))
		.filter((change) => change.before !== change.after);
}
