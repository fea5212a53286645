import { describe, expect, it } from 'vitest';
import { gridKey } from './grid-keys';

const key = (
	name: string,
	held: Partial<Record<'altKey' | 'ctrlKey' | 'metaKey' | 'shiftKey', boolean>> = {}
) => ({
	key: name,
	altKey: false,
	ctrlKey: false,
	metaKey: false,
	shiftKey: false,
	...held
});

describe('a key in the entry grid', () => {
	it.each([
		['Enter', {}, 'next'],
		['ArrowUp', {}, 'up'],
		['ArrowLeft', {}, null],
		['ArrowLeft', { altKey: true }, 'cell-left'],
		['ArrowRight', { ctrlKey: true }, 'cell-right'],
		['ArrowRight', { ctrlKey: true, shiftKey: true }, null],
		['d', { ctrlKey: true }, 'fill'],
		['D', { metaKey: true }, 'fill'],
		['d', {}, null],
		['z', { ctrlKey: true }, 'undo'],
		['z', { ctrlKey: true, shiftKey: true }, null],
		['?', { shiftKey: true }, 'keys'],
		['1', {}, null]
	] as const)('%s with %j means %s', (name, held, act) => {
		expect(gridKey(key(name, held), true)).toBe(act);
	});

	it('leaves undo to a field that has text of its own', () => {
		expect(gridKey(key('z', { ctrlKey: true }), false)).toBeNull();
	});
});
