import { describe, expect, it } from 'vitest';
import { isFiltered, listAddress } from './list-address';
import { readListing } from './listing';
import { partsQuery } from './part';

const read = (address: string) => readListing(partsQuery, new URLSearchParams(address));

describe('readListing', () => {
	it('reads the state of a list from its address', () => {
		expect(read('q=forge&kind=board&sort=newest&way=down&page=3')).toEqual({
			q: 'forge',
			kind: 'board',
			sort: 'newest',
			way: 'down',
			page: 3
		});
	});

	it('falls back where an old link says what is no longer there', () => {
		expect(read('kind=teapot&sort=colour&page=-4&page=x&other=1')).toEqual({
			q: '',
			sort: 'name',
			way: 'up',
			page: 1
		});
	});
});

describe('listAddress', () => {
	it('keeps defaults out and returns to the first page when the rows change', () => {
		expect(listAddress(partsQuery, read('page=4'), { kind: 'board' })).toBe('?kind=board');
		expect(listAddress(partsQuery, read('q=a&page=4'), { page: 5 })).toBe('?q=a&page=5');
		expect(listAddress(partsQuery, read('kind=board'), { kind: undefined })).toBe('?');
	});

	it('reads back what it wrote', () => {
		const query = read('q=a b&kind=memory&sort=kind&way=down');
		expect(read(listAddress(partsQuery, query, {}).slice(1))).toEqual(query);
	});
});

describe('isFiltered', () => {
	it('does not take an order for a filter', () => {
		expect(isFiltered(partsQuery, read('sort=newest&page=2'))).toBe(false);
		expect(isFiltered(partsQuery, read('kind=board'))).toBe(true);
	});
});
