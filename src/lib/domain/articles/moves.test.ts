import { describe, expect, it } from 'vitest';
import type { Actor, Role } from '../people/roles';
import { movesFor } from './moves';
import { stages } from './stage';

const actor = (id: string, ...roles: Role[]): Actor => ({ id, name: id, email: `${id}@example.org`, roles });
const writer = actor('ines', 'writer');
const editor = actor('marit', 'editor');
const both = actor('jonas', 'writer', 'editor');

describe('moves open to a person', () => {
	it('lets a writer edit and submit what is theirs, and nothing of others', () => {
		expect(movesFor(writer, { stage: 'drafting', hasPage: false }, 'ines')).toEqual(['submit', 'edit']);
		expect(movesFor(writer, { stage: 'drafting', hasPage: false }, 'jonas')).toEqual([]);
		expect(movesFor(writer, { stage: 'in-review', hasPage: false }, 'ines')).toEqual(['edit']);
	});

	it('never lets anybody approve an article of their own, whatever their roles', () => {
		for (const stage of stages)
			expect(movesFor(both, { stage, hasPage: true }, 'jonas')).not.toContain('approve');
		expect(movesFor(editor, { stage: 'in-review', hasPage: false }, 'jonas')).toContain('approve');
	});

	it('gives testers, liaisons and admins no move', () => {
		for (const role of ['tester', 'liaison', 'admin'] as const)
			for (const stage of stages)
				expect(movesFor(actor('x', role), { stage, hasPage: true }, 'ines')).toEqual([]);
	});
});
