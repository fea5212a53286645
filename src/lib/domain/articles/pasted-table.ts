import Papa from 'papaparse';

const cell = (text: string): string =>
	text
		.replace(/\s+/g, ' ')
		.trim()
		// An odd number of backslashes escapes it already.
		.replace(/(\\*)\|/g, (whole, before: string) => (before.length % 2 === 1 ? whole : `${before}\\|`));

const isNumber = (text: string): boolean =>
	/^[+\u2212-]?\d[\d.,\s\u00a0\u202f]*(?:\s?[%°\w/]{0,6})?$/.test(text);

/** Rows as a Markdown table, the first of them its head; columns of numbers stand at the right. Cells are Markdown already. */
export function markdownTable(rows: readonly (readonly string[])[]): string {
	const width = Math.max(0, ...rows.map((row) => row.length));
	const columns = Array.from({ length: width }, (_, at) => at);
	const texts = rows.map((row) => columns.map((at) => cell(row[at] ?? '')));
	const [head = [], ...body] = texts;
	const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
	const rule = columns.map((at) => {
		const filled = body.map((row) => row[at] ?? '').filter((text) => text !== '');
		return filled.length > 0 && filled.every(isNumber) ? '---:' : '---';
	});
	return [line(head), line(rule), ...body.map(line)].join('\n');
}

const escaped = (text: string): string => text.replace(/[\\`*_[\]<>]/g, '\\$&');

/**
 * A block copied from a spreadsheet as a Markdown table; null where the text is none. A block has tabs, and as many of
 * them in each row.
 */
export function tableOfBlock(text: string): string | null {
	if (!text.includes('\t')) return null;
	const { data } = Papa.parse<string[]>(text.replace(/\r\n?/g, '\n').replace(/\n+$/, ''), {
		delimiter: '\t'
	});
	const width = data[0]?.length ?? 0;
	if (width < 2 || data.some((row) => row.length !== width)) return null;
	// Code that is indented by tabs has empty first cells throughout.
	if (data.length < 2 || data.every((row) => row[0] === '')) return null;
	return markdownTable(data.map((row) => row.map(escaped)));
}
