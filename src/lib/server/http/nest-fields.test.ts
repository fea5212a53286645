import { describe, expect, it } from 'vitest';
import { nestFields } from './nest-fields';

const form = (...pairs: [string, string][]) => {
	const data = new FormData();
	for (const [name, value] of pairs) data.append(name, value);
	return data;
};

describe('nestFields', () => {
	it('reads rows in the order of their numbers, choices as a list, and plain fields as they are', () => {
		expect(
			nestFields(
				form(
					['name', 'Bench one'],
					['rows.10.value', 'b'],
					['rows.2.value', 'a'],
					['samples[]', 'x'],
					['samples[]', 'y']
				)
			)
		).toEqual({ name: 'Bench one', rows: [{ value: 'a' }, { value: 'b' }], samples: ['x', 'y'] });
	});

	it('does not let a name reach a prototype', () => {
		const read = nestFields(
			form(['__proto__.polluted', 'yes'], ['constructor', 'x'], ['a.__proto__.b', 'x'])
		);
		expect(Object.keys(read)).toEqual([]);
		expect(({} as { polluted?: string }).polluted).toBeUndefined();
	});

	it('is not tricked into a sparse list', () => {
		expect(nestFields(form(['rows.999999999.value', 'a']))).toEqual({ rows: [{ value: 'a' }] });
	});
});
