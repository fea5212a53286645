import { describe, expect, it } from 'vitest';
import { editorCommands } from './editor-commands';
import { keyOf, keyProblem, keysOf, shownKeys } from './keys';

const pressed = { ctrlKey: false, metaKey: false, altKey: false, shiftKey: false };

describe('keys', () => {
	it('are read as they are pressed, and shown as they are written on keyboards', () => {
		expect(keysOf({ ...pressed, key: 'Control', ctrlKey: true }, false)).toBeNull();
		expect(keysOf({ ...pressed, key: 'O', ctrlKey: true, shiftKey: true }, false)).toBe('Mod-Shift-o');
		expect(keysOf({ ...pressed, key: 'o', metaKey: true }, true)).toBe('Mod-o');
		expect(keysOf({ ...pressed, key: ' ', ctrlKey: true }, true)).toBe('Ctrl-Space');
		expect(keysOf({ ...pressed, key: '?', ctrlKey: true, shiftKey: true }, false)).toBe('Mod-?');
		expect([shownKeys('Mod-Shift-o'), shownKeys('F8'), shownKeys('Mod--')]).toEqual([
			'Mod Shift O',
			'F8',
			'Mod -'
		]);
	});

	it('of two commands never are the same, nor what is kept for others', () => {
		for (const { id, keys } of editorCommands)
			expect(keyProblem(keys, id, editorCommands, {}), id).toBeNull();
	});

	it('are refused with the command that has them, until that one has another', () => {
		const [first, second] = editorCommands;
		if (!first || !second) throw new Error('no commands');
		expect(keyProblem(second.keys, first.id, editorCommands, {})).toContain(second.words);
		const changed = { [second.id]: 'F9' };
		expect(keyProblem(second.keys, first.id, editorCommands, changed)).toBeNull();
		expect(keyOf(second, changed)).toBe('F9');
	});

	it('that would be typed, or that others need, are refused', () => {
		for (const keys of ['a', 'Shift-A', 'Enter', 'Mod-k', 'Mod-v'])
			expect(keyProblem(keys, 'save', editorCommands, {}), keys).not.toBeNull();
	});
});
