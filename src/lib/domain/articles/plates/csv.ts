export type Field = string | number | null;

/** One field: quoted where it must be, doubled quotes inside (RFC 4180, rules 5 to 7). */
function field(value: Field): string {
	if (value === null) return '';
	if (typeof value === 'number') return String(value);
	// A text that a spreadsheet would run as a formula is shown as text (common practice, no source).
	const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
	return /[",\r\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text;
}

/** Rows of fields as CSV by RFC 4180. */
export const csv = (rows: Field[][]): string => rows.map((row) => `${row.map(field).join(',')}\r\n`).join('');
