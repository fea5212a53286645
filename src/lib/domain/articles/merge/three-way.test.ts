import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mergeTexts, resolved, type Choice, type MergeText } from './three-way';

const text = (source: string, more: Partial<MergeText> = {}): MergeText => ({
	title: 'Brisk 360',
	standfirst: 'A cooler.',
	source,
	...more
});
const base = 'Intro.\n\nThe fan is loud.\n\n- one\n- two\n\nEnd.';
const merged = (mine: string, theirs: string, made: Record<string, Choice> = {}) =>
	resolved(mergeTexts(text(base), text(mine), text(theirs)), made)?.source;

describe('two people', () => {
	it('who changed different paragraphs need not choose', () => {
		const mine = base.replace('Intro.', 'Introduction.');
		const theirs = base.replace('End.', 'The end.');
		const merge = mergeTexts(text(base), text(mine), text(theirs));
		expect(merge.conflicts).toEqual([]);
		expect([merge.mineAlone, merge.theirsAlone]).toEqual([1, 1]);
		expect(merged(mine, theirs)).toBe(base.replace('Intro.', 'Introduction.').replace('End.', 'The end.'));
	});

	it('who changed different words of one sentence are offered both together', () => {
		const mine = base.replace('The fan', 'The second fan');
		const theirs = base.replace('loud.', 'loud at full speed.');
		const [only, ...more] = mergeTexts(text(base), text(mine), text(theirs)).conflicts;
		expect(more).toEqual([]);
		expect(only).toMatchObject({ suggested: 'together', mine: 'The second fan is loud.' });
		expect(merged(mine, theirs)).toContain('The second fan is loud at full speed.');
	});

	it('who changed the same words must choose, and get what they chose', () => {
		const mine = base.replace('loud', 'quiet');
		const theirs = base.replace('loud', 'silent');
		const [only] = mergeTexts(text(base), text(mine), text(theirs)).conflicts;
		if (!only) throw new Error('no conflict');
		expect([only.suggested, Object.keys(only.options)]).toEqual([null, ['theirs', 'mine', 'both']]);
		expect(merged(mine, theirs)).toBeUndefined();
		const as = (choice: Choice) => merged(mine, theirs, { [only.id]: choice });
		expect(as('mine')).toBe(mine);
		expect(as('theirs')).toBe(theirs);
		expect(as('both')).toContain('The fan is silent.\n\nThe fan is quiet.');
	});

	it('who both wrote on at the end keep both, theirs first', () => {
		expect(merged(`${base}\n\nMine.`, `${base}\n\nTheirs.`)).toBe(`${base}\n\nTheirs.\n\nMine.`);
	});

	it('who wrote the same are of one mind', () => {
		const both = base.replace('loud', 'quiet');
		expect(mergeTexts(text(base), text(both), text(both)).conflicts).toEqual([]);
		expect(merged(both, both)).toBe(both);
	});

	it('of whom one took out what the other changed must choose', () => {
		const [only] = mergeTexts(
			text(base),
			text(base.replace('The fan is loud.\n\n', '')),
			text(base.replace('loud', 'quiet'))
		).conflicts;
		expect(only?.suggested).toBeNull();
	});

	it('who gave two titles must choose one', () => {
		const merge = mergeTexts(
			text(base),
			text(base, { title: 'Mine here' }),
			text(base, { title: 'Theirs now' })
		);
		const [only] = merge.conflicts;
		if (!only) throw new Error('no conflict');
		expect([only.place, only.suggested, only.options.both]).toEqual(['title', null, undefined]);
		expect(resolved(merge, { [only.id]: 'mine' })?.title).toBe('Mine here');
	});
});

it('who only moved empty lines about loses nobody their words', () => {
	const { conflicts } = mergeTexts(text(''), text('\n'), text('fan'));
	expect(conflicts.map((one) => one.suggested)).toEqual(['theirs']);
});

const words = fc.array(fc.constantFrom('fan', 'loud', '', 'two words', '- item', '| a | b |'), {
	maxLength: 12
});
const source = words.map((lines) => lines.join('\n'));

it('gives either text back whole when everything is chosen from it and the other is as it was', () => {
	fc.assert(
		fc.property(source, source, (was, is) => {
			expect(resolved(mergeTexts(text(was), text(is), text(was)), {})?.source).toBe(is);
			expect(resolved(mergeTexts(text(was), text(was), text(is)), {})?.source).toBe(is);
		})
	);
});

it('keeps every word of both where all is taken together or one after the other', () => {
	fc.assert(
		fc.property(source, source, source, (was, mine, theirs) => {
			const merge = mergeTexts(text(was), text(mine), text(theirs));
			// A passage that only one of them took out is gone; what either wrote anew is there.
			const all = resolved(
				merge,
				Object.fromEntries(
					merge.conflicts.map((one) => [
						one.id,
						one.suggested ?? (one.options.both ? 'both' : one.mine.trim() === '' ? 'theirs' : 'mine')
					])
				)
			);
			const fresh = (now: string) =>
				now.split('\n').filter((line) => line.trim() !== '' && !was.split('\n').includes(line));
			for (const line of [...fresh(mine), ...fresh(theirs)])
				expect(all?.source).toContain(line.split(' ')[0]);
		})
	);
});
