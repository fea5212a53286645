import type { Script, ScriptLine } from './script';

/**
 * Words a minute. Conversation in American English comes to about 150 (National Center for Voice and Speech, as others
 * cite it); reading aloud to 183 on average (Brysbaert 2019, J. Mem. Lang. 109:104047).
 */
export const paces = { least: 80, usual: 150, most: 260 } as const;

/** Seconds in which a cue is done: the eye needs time with a plate (common practice, no source). */
export const cueSeconds = 4;
/** Seconds of breath before a section (common practice, no source). */
const breathSeconds = 1;

/** How long a line takes at a pace in words a minute. Seconds. @example lineSeconds({ kind: 'say', words: 150 }, 150) === 60 */
export const lineSeconds = ({ kind, words }: Pick<ScriptLine, 'kind' | 'words'>, pace: number): number =>
	kind === 'cue' ? cueSeconds : (words * 60) / pace;

export interface Timed {
	title: string;
	/** Seconds from the beginning, and how long it takes. */
	from: number;
	seconds: number;
	words: number;
}

/** When each section begins and how long it takes at a pace in words a minute; RangeError outside what can be spoken. */
export function timesOf({ sections }: Pick<Script, 'sections'>, pace: number): Timed[] {
	if (!(pace >= paces.least && pace <= paces.most))
		throw new RangeError(`A pace lies between ${paces.least} and ${paces.most} words a minute.`);
	let from = 0;
	return sections.map(({ title, lines }, at) => {
		const breath = at === 0 ? 0 : breathSeconds;
		const seconds = breath + lines.reduce((sum, line) => sum + lineSeconds(line, pace), 0);
		const timed = { title, from, seconds, words: lines.reduce((sum, line) => sum + line.words, 0) };
		from += seconds;
		return timed;
	});
}

/** Seconds as minutes and seconds. @example clock(75.4) === '1:15' */
export function clock(seconds: number): string {
	const whole = Math.round(seconds);
	return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

export { breathSeconds };
