import { describe, expect, it } from 'vitest';
import { comparable } from './comparable';

// Scales with an arbitrary zero and logarithms: Stevens 1946 on ratio scales (from memory); the list of spellings is
// common practice, no source.
describe('what may be held against its baseline as a ratio', () => {
	it.each(['°C', '° C', '°F', '℃', 'degC', 'deg C', 'celsius', 'dB', 'dB(A)', 'dBA', 'dBm', 'dB SPL', 'pH'])(
		'not %s',
		(unit) => {
			expect(comparable(unit, [40, 50])).toMatchObject({
				by: 'difference',
				why: expect.stringContaining(unit) as unknown
			});
		}
	);

	it.each([
		's',
		'ms',
		'frame/s',
		'W',
		'J',
		'K',
		'MB/s',
		'B',
		'B/s',
		'%',
		'points',
		'',
		'C',
		'events/s',
		'MT/s',
		'GiB/s'
	])('but “%s”', (unit) => {
		expect(comparable(unit, [40, 50]).by).toBe('ratio');
	});

	it.each([[[0, 5]], [[5, -3]], [[Number.NaN, 3]]])('not where a mean is %j', (means) => {
		expect(comparable('s', means)).toMatchObject({
			by: 'difference',
			why: expect.stringContaining('zero') as unknown
		});
	});
});
