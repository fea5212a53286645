import { describe, expect, it } from 'vitest';
import { after, closedWords, moves, open, stages, stageWords, transitions } from './stage';

// Checked against product.md, "Review, print, correct":
// drafting → in review → (changes asked → in review) → approved → scheduled → published → (new edition → …) or withdrawn.
describe('the stages of an article', () => {
	it('walks the line that product.md draws', () => {
		let stage = after('drafting', 'submit');
		expect(stage).toBe('in-review');
		stage = after('in-review', 'ask-changes');
		expect(stage).toBe('changes-asked');
		expect(after('changes-asked', 'submit')).toBe('in-review');
		expect(after('in-review', 'approve')).toBe('approved');
		expect(after('approved', 'schedule')).toBe('scheduled');
		expect(after('scheduled', 'publish')).toBe('published');
		expect(after('published', 'revise')).toBe('drafting');
		expect(after('published', 'withdraw')).toBe('withdrawn');
	});

	it('takes the approval off when an approved or scheduled text is edited', () => {
		expect(after('approved', 'edit')).toBe('in-review');
		expect(after('scheduled', 'edit')).toBe('in-review');
	});

	it('prints nothing that is not approved, and edits nothing that is printed', () => {
		const printable = stages.filter((stage) => after(stage, 'publish') !== null);
		expect(printable).toEqual(['approved', 'scheduled']);
		expect(stages.filter((stage) => after(stage, 'schedule') !== null)).toEqual(['approved', 'scheduled']);
		expect(after('published', 'edit')).toBeNull();
		expect(after('withdrawn', 'edit')).toBeNull();
		expect(stages.filter((stage) => after(stage, 'approve') !== null)).toEqual(['in-review']);
	});

	it('withdraws or keeps a page only where readers have one', () => {
		for (const stage of stages) {
			expect(open({ stage, hasPage: false }, 'withdraw')).toBe(false);
			expect(open({ stage, hasPage: false }, 'keep')).toBe(false);
		}
		expect(open({ stage: 'drafting', hasPage: true }, 'keep')).toBe(true);
		expect(open({ stage: 'published', hasPage: true }, 'keep')).toBe(false);
	});

	it('reaches every stage, and leads nowhere else', () => {
		const reached = new Set(stages.flatMap((stage) => Object.values(transitions[stage])));
		expect([...reached].sort()).toEqual([...stages].sort());
	});

	it('has words for every refusal that name the stage', () => {
		for (const stage of stages)
			for (const move of moves) {
				if (after(stage, move) !== null) continue;
				expect(closedWords(stage, move)).toContain(stageWords[stage]);
			}
	});
});
