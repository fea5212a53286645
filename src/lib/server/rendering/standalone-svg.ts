/**
 * The colour tokens as they are in tokens.css, for a drawing that leaves the site. A test holds them against it.
 */
export const inks: Record<string, readonly [light: string, dark: string]> = {
	sheet: ['#fffefa', '#1b2127'],
	ink: ['#17202a', '#e9e4d8'],
	graphite: ['#4a5560', '#a9b1b8'],
	rule: ['#d8d2c4', '#333b43'],
	blue: ['#1d3f8f', '#8fb0f2'],
	'blue-tint': ['#e4eaf6', '#22304a'],
	verdigris: ['#1f6b5a', '#74c3ac'],
	brass: ['#7a5a10', '#e0b65b'],
	plum: ['#6e3f87', '#c79bdd']
};

/** The tokens as declarations, for light or dark. */
export const tokens = (which: 0 | 1): string =>
	Object.entries(inks)
		.map(([name, colours]) => `--color-${name}:${colours[which]}`)
		.join(';');

const style = `<style>svg{${tokens(0)};background:var(--color-sheet);font-family:'Instrument Sans','Helvetica Neue',Arial,sans-serif;font-variant-numeric:tabular-nums}@media(prefers-color-scheme:dark){svg{${tokens(1)}}}</style>`;

/** The wide drawing out of a plate's markup, as XML. */
export function wideDrawing(drawing: string): string {
	const end = drawing.indexOf('</svg>');
	const svg = end < 0 ? '' : drawing.slice(drawing.indexOf('<svg'), end + '</svg>'.length);
	if (svg === '') throw new Error('There is no drawing in this markup.');
	// Attributes without a value and entities of HTML are no XML; the drawing has neither but these.
	return svg.replace(/&nbsp;/g, '&#160;');
}

/** A plate's wide drawing as a file of its own: with an XML head, its colours and its type, light and dark. */
export function standaloneSvg(drawing: string): string {
	const xml = wideDrawing(drawing);
	return `<?xml version="1.0" encoding="UTF-8"?>\n${xml.replace(/^(<svg[^>]*>)/, `$1${style}`)}\n`;
}
