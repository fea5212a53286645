import { describe, expect, it } from 'vitest';
import type { Claim, ClaimState } from '../../../domain/articles/claims/claims';
import { claimsInWords, nextToMend, placeNotes } from './claim-notes';

const claim = (from: number, state: ClaimState): Claim => ({
	from,
	to: from + 3,
	line: 1,
	kind: 'number',
	text: '9 %',
	state,
	stored: '',
	why: '',
	trap: null,
	bindFrom: from,
	bindTo: from + 3,
	bindings: []
});

describe('notes in the margin', () => {
	it('stand beside their line, and never over one another', () => {
		const placed = [0, 8, 200].map((top, index) => ({
			claim: claim(index, 'agrees'),
			from: index,
			to: index + 1,
			top
		}));
		const notes = placeNotes(placed, [40, 60, 20]);
		expect(notes.map((note) => note.at)).toEqual([0, 50, 200]);
		notes
			.slice(1)
			.forEach((note, index) =>
				expect(note.at).toBeGreaterThanOrEqual((notes[index]?.at ?? 0) + ([40, 60][index] ?? 0))
			);
	});
	it('are counted in words', () => {
		const states: ClaimState[] = ['contradicts', 'contradicts', 'not-backed', 'agrees', 'bound'];
		expect(claimsInWords(states.map((state) => ({ state })))).toBe('2 contradict, 1 not backed');
		expect(claimsInWords([{ state: 'agrees' }])).toBe('nothing against the data');
	});
	it('lead from one that needs an eye to the next, and round', () => {
		const claims = [claim(5, 'not-backed'), claim(20, 'agrees'), claim(40, 'contradicts')];
		expect(nextToMend(claims, 0)?.from).toBe(5);
		expect(nextToMend(claims, 5)?.from).toBe(40);
		expect(nextToMend(claims, 40)?.from).toBe(5);
		expect(nextToMend([claim(1, 'bound')], 0)).toBe(null);
	});
});
