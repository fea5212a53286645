import face from '@fontsource-variable/instrument-sans/files/instrument-sans-latin-wght-normal.woff2?inline';
import { escapeHtml } from '../../domain/articles/html';
import type { PlateSpec } from '../../domain/articles/plates/spec';
import { tokens, wideDrawing } from './standalone-svg';

export const screens = { '1080p': [1920, 1080], '2160p': [3840, 2160] } as const;
export type Screen = keyof typeof screens;
export type Look = 'light' | 'dark';

/** The frame everything is set in; a larger screen shows the same, larger. */
const width = 1920;
const height = 1080;
const margin = 96;
const head = 190;
const foot = 90;

const style = (look: Look) =>
	`<style>@font-face{font-family:'Instrument Sans';src:url(${face}) format('woff2');font-weight:400 700}svg{${tokens(look === 'dark' ? 1 : 0)};font-family:'Instrument Sans','Helvetica Neue',Arial,sans-serif;font-variant-numeric:tabular-nums}</style>`;

const sizeOf = (svg: string): [number, number] => {
	const [, w = '0', h = '0'] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg) ?? [];
	return [Number(w), Number(h)];
};

const line = (y: number, size: number, weight: number, colour: string, text: string) =>
	`<text x="${margin}" y="${y}" font-size="${size}" font-weight="${weight}" fill="var(--color-${colour})">${escapeHtml(text)}</text>`;

/** A title in as many letters as fit the frame. */
const cut = (text: string, letters: number) =>
	text.length <= letters ? text : `${text.slice(0, text.lastIndexOf(' ', letters - 1))} …`;

/**
 * A plate set for a screen, 16 : 9, at the size of that screen: title, drawing as large as fits, what was measured. It carries its
 * type with it, so that it looks the same in any program.
 */
export function screenSvg(
	spec: PlateSpec,
	drawing: string,
	{ screen, look }: { screen: Screen; look: Look }
): string {
	const inner = wideDrawing(drawing);
	const [w, h] = sizeOf(inner);
	if (!(w > 0 && h > 0)) throw new Error('This drawing has no size.');
	const scale = Math.min((width - 2 * margin) / w, (height - head - foot - 40) / h);
	const x = (width - w * scale) / 2;
	const y = head + (height - head - foot - h * scale) / 2;
	const placed = inner.replace(
		/^<svg([^>]*)>/,
		(_, attributes: string) =>
			`<svg x="${x.toFixed(1)}" y="${y.toFixed(1)}" width="${(w * scale).toFixed(1)}" height="${(h * scale).toFixed(1)}"${attributes.replace(/ (?:x|y|width|height|class)="[^"]*"/g, '')}>`
	);
	const [outW, outH] = screens[screen];
	return [
		'<?xml version="1.0" encoding="UTF-8"?>',
		`<svg xmlns="http://www.w3.org/2000/svg" width="${outW}" height="${outH}" viewBox="0 0 ${width} ${height}">`,
		style(look),
		`<rect width="${width}" height="${height}" fill="var(--color-sheet)"/>`,
		line(104, 54, 650, 'ink', cut(spec.title, 62)),
		line(156, 30, 400, 'graphite', cut(spec.sub, 115)),
		placed,
		line(height - 44, 22, 400, 'graphite', cut(spec.foot.join(' '), 155)),
		'</svg>',
		''
	].join('\n');
}
