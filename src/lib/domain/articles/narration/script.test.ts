import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { clock, timesOf } from './pace';
import { scriptSubRip, scriptText } from './script-files';
import { scriptOf, type Script } from './script';

const data = measuredArticle();
const script = (source: string) =>
	scriptOf({ title: 'Four ways', standfirst: 'Which is worth it.', source }, data);
const lines = (source: string) =>
	script(source).sections.flatMap((section) => section.lines.map(({ kind, text }) => [kind, text]));

describe('an article as a script', () => {
	it('opens with title and standfirst, and is parted by its headings', () => {
		const { sections } = script('First.\n\n## What it costs\n\nMoney.');
		expect(sections.map((section) => section.title)).toEqual(['Opening', 'What it costs']);
		expect(sections[0]?.lines.map((line) => line.text)).toEqual([
			'Four ways.',
			'Which is worth it.',
			'First.'
		]);
	});

	it('says steps one by one, notes as asides, and shows tables, quotes and pictures as cues', () => {
		expect(
			lines(
				'1. Open it\n2. Set **4.95 GHz**\n\n:::note\nBy the way.\n:::\n\n| a | b |\n| - | - |\n| 1 | 2 |\n\n> Yes.\n\n![A rig on a bench](/pictures/a.webp)'
			).slice(2)
		).toEqual([
			['step', 'Step one: Open it'],
			['step', 'Step two: Set four point nine five gigahertz'],
			['aside', 'By the way.'],
			['cue', '[Table]'],
			['cue', '[Quote]'],
			['say', 'Yes.'],
			['cue', '[Picture: A rig on a bench]']
		]);
	});

	it('reads what directives print, as words, and names those that find nothing', () => {
		const read = script(
			'It takes :reading{workload=source-build profile=stock} in all.\n\n::plate{kind=gains}'
		);
		expect(read.gaps).toEqual([]);
		const [sentence, plate] = read.sections[0]?.lines.slice(2) ?? [];
		expect(sentence?.text).toMatch(/^It takes [a-z -]+ point [a-z -]+ seconds in all\.$/);
		expect(plate).toMatchObject({
			kind: 'cue',
			text: expect.stringMatching(/^\[Plate: /) as string,
			words: 0
		});
		expect(plate?.plate).toBeTruthy();
		const { sections, gaps } = script('It takes :reading{workload=nothing profile=stock} in all.');
		expect(gaps).toHaveLength(1);
		expect(sections[0]?.lines.at(-1)?.text).toBe('It takes in all.');
	});

	it('does not throw for what anybody types', () => {
		expect(script('> '.repeat(20_000)).gaps).toHaveLength(1);
		expect(script('x'.repeat(2_000_000)).gaps).toHaveLength(1);
	});
});

describe('its time', () => {
	const words = (n: number): Script => ({
		title: '',
		gaps: [],
		sections: [
			{
				title: 'All',
				line: 1,
				lines: [{ kind: 'say', text: 'word '.repeat(n).trim(), plate: null, line: 1, words: n }]
			}
		]
	});

	// outside-checks.md, section 14: 1200 words take 8.0 min at 150 words a minute, 7.5 at 160, 8.571 at 140 (computed there).
	it.each([
		[150, 8],
		[160, 7.5],
		[140, 8.571]
	])('at %i words a minute: 1200 words in %f minutes', (pace, minutes) =>
		expect((timesOf(words(1200), pace)[0]?.seconds ?? 0) / 60).toBeCloseTo(minutes, 3)
	);

	it('refuses a pace nobody speaks at, and is read as a clock', () => {
		for (const pace of [0, 79, 261, Number.NaN]) expect(() => timesOf(words(1), pace)).toThrow(RangeError);
		expect([0, 59.6, 75.4, 3600].map(clock)).toEqual(['0:00', '1:00', '1:15', '60:00']);
	});
});

describe('its files', () => {
	const one = script(
		'Held at 4.95 GHz --> it <b>ends</b> {sooner} than one would think of such a thing, by a lot.\n\n## Next\n\nDone.'
	);

	it('are plain text with the times of the sections', () => {
		const text = scriptText(one, 150);
		expect(text).toMatch(
			/^Four ways\nAbout 0:1\d at 150 words a minute\n\n== Opening \(from 0:00, 0:1\d\)\n\nFour ways\.\n/
		);
		expect(text).toContain('== Next (from 0:1');
	});

	// SubRip as its readers take it (Wikipedia, “SubRip”; no standard): counter, "HH:MM:SS,mmm --> HH:MM:SS,mmm", text, empty line.
	it('are SubRip whose captions follow each other, two short lines at most', () => {
		const captions = scriptSubRip(one, 150)
			.split('\r\n\r\n')
			.map((caption) => caption.trim().split('\r\n'));
		const time = /^(\d\d):(\d\d):(\d\d),(\d{3}) --> (\d\d):(\d\d):(\d\d),(\d{3})$/;
		let end = 0;
		for (const [at, [number, stamps = '', ...rows]] of captions.entries()) {
			expect(number).toBe(String(at + 1));
			const [h1, m1, s1, f1, h2, m2, s2, f2] = (time.exec(stamps) ?? []).slice(1).map(Number);
			const seconds = (h = 0, m = 0, s = 0, f = 0) => h * 3600 + m * 60 + s + f / 1000;
			expect(seconds(h1, m1, s1, f1)).toBeGreaterThanOrEqual(end);
			end = seconds(h2, m2, s2, f2);
			expect(end).toBeGreaterThan(seconds(h1, m1, s1, f1));
			expect(rows.length).toBeLessThanOrEqual(2);
			for (const row of rows) {
				expect(row.length).toBeLessThanOrEqual(42);
				expect(row).not.toMatch(/-->|[<>{}]/);
			}
		}
		expect(end).toBeCloseTo(
			timesOf(one, 150).reduce((sum, section) => sum + section.seconds, 0),
			2
		);
	});
});
