import { breathSeconds, clock, lineSeconds, timesOf } from './pace';
import type { Script, ScriptLine } from './script';

const marks: Record<ScriptLine['kind'], string> = { say: '', step: '', aside: '(aside) ', cue: '' };

/** The script as plain text to read from: sections with their times, a line for each thing said or done. */
export function scriptText(script: Script, pace: number): string {
	const times = timesOf(script, pace);
	const whole = times.reduce((sum, one) => sum + one.seconds, 0);
	const parts = script.sections.map(({ title, lines }, at) =>
		[
			`== ${title} (from ${clock(times[at]?.from ?? 0)}, ${clock(times[at]?.seconds ?? 0)})`,
			'',
			...lines.map((line) => marks[line.kind] + line.text)
		].join('\n')
	);
	return [`${script.title}\nAbout ${clock(whole)} at ${pace} words a minute`, ...parts]
		.join('\n\n')
		.concat('\n');
}

/** Two lines of this many characters at most (common practice of subtitling, no source). */
const lineLength = 42;

/** A text in captions of two lines at most, broken between words. */
function captions(text: string): string[][] {
	const rows: string[] = [];
	for (const word of text.split(/\s+/)) {
		const last = rows.at(-1);
		if (last !== undefined && last.length + 1 + word.length <= lineLength)
			rows[rows.length - 1] = `${last} ${word}`;
		else rows.push(word);
	}
	const all: string[][] = [];
	for (let at = 0; at < rows.length; at += 2) all.push(rows.slice(at, at + 2));
	return all;
}

/** @example stamp(3661.5) === '01:01:01,500' */
function stamp(seconds: number): string {
	const ms = Math.round(seconds * 1000);
	const part = (value: number, width: number) => String(value).padStart(width, '0');
	return `${part(Math.floor(ms / 3_600_000), 2)}:${part(Math.floor(ms / 60_000) % 60, 2)}:${part(Math.floor(ms / 1000) % 60, 2)},${part(ms % 1000, 3)}`;
}

/**
 * The script as SubRip subtitles: numbered captions with their times at a pace, apart by an empty line. What would read
 * as a time arrow or as markup is written otherwise.
 */
export function scriptSubRip(script: Script, pace: number): string {
	const out: string[] = [];
	let at = 0;
	for (const [index, { lines }] of script.sections.entries()) {
		if (index > 0) at += breathSeconds;
		for (const line of lines) {
			const seconds = lineSeconds(line, pace);
			const pieces = captions(line.text.replace(/-->/g, '→').replace(/[<>{}]/g, ''));
			const letters = pieces.reduce((sum, rows) => sum + rows.join(' ').length, 0);
			for (const rows of pieces) {
				const until = at + (seconds * rows.join(' ').length) / letters;
				out.push(`${out.length + 1}\r\n${stamp(at)} --> ${stamp(until)}\r\n${rows.join('\r\n')}\r\n`);
				at = until;
			}
		}
	}
	return out.join('\r\n');
}
