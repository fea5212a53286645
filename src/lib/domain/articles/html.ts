const entities: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;'
};

/** Text made safe for element content and for quoted attributes. @example escapeHtml('<b>') === '&lt;b&gt;' */
export const escapeHtml = (text: string): string =>
	text.replace(/[&<>"']/g, (sign) => entities[sign] ?? sign);

/**
 * One element. Attribute values are escaped, undefined ones left out; `inner` is HTML already.
 * @example element('a', { href: '/x' }, 'go') === '<a href="/x">go</a>'
 */
export function element(
	tag: string,
	attributes: Record<string, string | number | undefined>,
	inner: string
): string {
	const written = Object.entries(attributes)
		.filter((entry): entry is [string, string | number] => entry[1] !== undefined)
		.map(([name, value]) => ` ${name}="${escapeHtml(String(value))}"`);
	return `<${tag}${written.join('')}>${inner}</${tag}>`;
}

/** A column of a table: its head, and whether it holds figures, which stand at the right. */
export interface Column {
	head: string;
	figures?: boolean;
}

/** Rows of a table that belong together, under a head of their own where there is one. */
export interface RowGroup {
	head?: string;
	rows: string[][];
}

/** A table of texts in a box of its own that scrolls on narrow screens; the first cell of a row is its head. */
export function table(caption: string, columns: Column[], groups: RowGroup[]): string {
	const kind = (index: number) => (columns[index]?.figures ? 'num' : undefined);
	const head = columns.map((column, index) =>
		element('th', { scope: 'col', class: kind(index) }, escapeHtml(column.head))
	);
	const row = (cells: string[]) =>
		`<tr>${cells
			.map((text, index) =>
				index === 0
					? element('th', { scope: 'row' }, escapeHtml(text))
					: element('td', { class: kind(index) }, escapeHtml(text))
			)
			.join('')}</tr>`;
	const bodies = groups.map(({ head: name, rows }) => {
		const title =
			name === undefined
				? ''
				: `<tr class="row-group">${element('th', { scope: 'rowgroup', colspan: columns.length }, escapeHtml(name))}</tr>`;
		return `<tbody>${title}${rows.map(row).join('')}</tbody>`;
	});
	// Focusable, so that what scrolls can be scrolled by keyboard.
	return element(
		'div',
		{ class: 'table-box', tabindex: 0, role: 'group', 'aria-label': caption },
		`<table><caption>${escapeHtml(caption)}</caption><thead><tr>${head.join('')}</tr></thead>${bodies.join('')}</table>`
	);
}
