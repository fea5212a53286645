import { describe, expect, it } from 'vitest';
import { addProgress, beforePrint, benchWords } from './desk-row';

const signed = { cells: 10, signed: 10, needed: 50, taken: 50 };
const measuring = { cells: 10, signed: 2, needed: 50, taken: 31 };

describe('a row of the desk', () => {
	it('says of the bench what matters next', () => {
		expect(benchWords(measuring)).toBe('31 of 50');
		expect(benchWords({ ...measuring, taken: 50 })).toBe('2 of 10 signed');
		expect(benchWords(signed)).toBe('signed');
		expect(benchWords(addProgress([]))).toBe('no campaign');
		expect(benchWords(addProgress([signed, measuring]))).toBe('81 of 100');
	});

	it('says what stands before print, and leaves the count to the preflight', () => {
		const state = {
			stage: 'in-review' as const,
			slotAt: new Date('2026-11-12T08:00:00Z'),
			bench: measuring,
			blockingComments: 2,
			embargoUntil: new Date('2026-11-13T13:00:00Z')
		};
		expect(beforePrint(state).parts).toEqual([
			'2 blocking comments',
			'cells not signed off',
			'a slot before the embargo ends'
		]);
	});

	it('names an embargo that only waits for a slot, and calls clear only what has passed the preflight', () => {
		const state = {
			stage: 'approved' as const,
			slotAt: null,
			bench: measuring,
			blockingComments: 0,
			embargoUntil: new Date('2026-11-13T13:00:00Z')
		};
		expect(beforePrint(state)).toMatchObject({ parts: [], clear: false, embargo: state.embargoUntil });
		expect(beforePrint({ ...state, embargoUntil: null }).clear).toBe(true);
		expect(beforePrint({ ...state, stage: 'drafting', bench: signed, embargoUntil: null }).clear).toBe(false);
	});
});
