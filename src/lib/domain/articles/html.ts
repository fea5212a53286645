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

/** A table of texts in a box of its own that scrolls on narrow screens; the first cell of a row is its head. */
export function table(caption: string, columns: Column[], rows: string[][]): string {
	const kind = (index: number) => (columns[index]?.figures ? 'num' : undefined);
	const head = columns.map((column, index) =>
		element('th', { scope: 'col', class: kind(index) }, escapeHtml(column.head))
	);
	const body = rows.map((row) => {
		const cells = row.map((text, index) =>
			index === 0
				? element('th', { scope: 'row' }, escapeHtml(text))
				: element('td', { class: kind(index) }, escapeHtml(text))
		);
		return `<tr>${cells.join('')}</tr>`;
	});
	// Focusable, so that what scrolls can be scrolled by keyboard.
	return element(
		'div',
		{ class: 'table-box', tabindex: 0, role: 'group', 'aria-label': caption },
		`<table><caption>${escapeHtml(caption)}</caption><thead><tr>${head.join('')}</tr></thead><tbody>${body.join('')}</tbody></table>`
	);
}
