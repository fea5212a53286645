import { element, escapeHtml } from '../html';
import { plateTable } from './numbers';
import { plateKey, type PlateSpec } from './spec';

/** What stands under the drawing depends on the specification alone, and is written once for each. */
const written = new WeakMap<PlateSpec, { platesAt: string; html: string }>();

function foot(spec: PlateSpec, key: string, platesAt: string): string {
	const known = written.get(spec);
	if (known?.platesAt === platesAt) return known.html;
	const file = (ending: string, words: string) =>
		element('a', { href: `${platesAt}${key}.${ending}`, 'data-plate-file': ending }, words);
	const html =
		element(
			'figcaption',
			{ class: 'plate-foot' },
			element('p', {}, escapeHtml(spec.foot.join(' '))) +
				element('p', { class: 'plate-files' }, `${file('csv', 'CSV')} ${file('svg', 'SVG')}`)
		) + element('details', { class: 'plate-numbers' }, `<summary>Numbers</summary>${plateTable(spec)}`);
	written.set(spec, { platesAt, html });
	return html;
}

/**
 * A plate on the page: title, drawing, what was measured, its numbers as a table, its files.
 * @param drawing SVG markup
 * @param platesAt where the files are, with a slash at its end
 */
export function plateFigure(spec: PlateSpec, drawing: string, line: number, platesAt: string): string {
	const key = plateKey(spec);
	return element(
		'figure',
		{ class: 'plate', id: `plate-${key}`, 'data-plate': key, 'data-line': line },
		[
			element('h3', {}, escapeHtml(spec.title)),
			element('p', { class: 'plate-sub' }, escapeHtml(spec.sub)),
			element('div', { class: 'plate-drawing' }, drawing),
			foot(spec, key, platesAt)
		].join('')
	);
}
