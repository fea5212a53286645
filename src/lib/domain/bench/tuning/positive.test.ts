import { expect, it } from 'vitest';
import { positive } from './positive';

it('passes what is above zero and names what is not', () => {
	expect(positive(0.1, 'ratio')).toBe(0.1);
	for (const wrong of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) {
		expect(() => positive(wrong, 'ratio')).toThrow('The ratio must be above zero.');
	}
});
