import { describe, expect, it } from 'vitest';
import { changesOf } from './audit-change';

describe('changesOf', () => {
	it('names what changed and leaves out what stayed', () => {
		expect(changesOf({ name: 'a', zone: 'UTC' }, { name: 'b', zone: 'UTC' })).toEqual([
			{ field: 'name', before: 'a', after: 'b' }
		]);
	});

	it('says lists as words, and nothing for what is empty', () => {
		expect(changesOf({ roles: [] }, { roles: ['tester', 'admin'] })).toEqual([
			{ field: 'roles', before: undefined, after: 'tester, admin' }
		]);
		expect(changesOf(null, null)).toEqual([]);
		expect(changesOf({ a: null }, { a: '' })).toEqual([]);
	});

	it('keeps zero and false, and cuts what is long', () => {
		expect(changesOf({ n: 1, on: true }, { n: 0, on: false })).toEqual([
			{ field: 'n', before: '1', after: '0' },
			{ field: 'on', before: 'true', after: 'false' }
		]);
		expect(changesOf(null, { text: 'x'.repeat(500) })[0]?.after).toHaveLength(161);
	});

	it('takes a bare value and what is nested as it stands', () => {
		expect(changesOf(3, { at: { x: 1 } })).toEqual([
			{ field: 'value', before: '3', after: undefined },
			{ field: 'at', before: undefined, after: '{"x":1}' }
		]);
	});
});
