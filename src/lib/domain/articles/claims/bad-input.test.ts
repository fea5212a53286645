import { describe, expect, it } from 'vitest';
import { claimsData } from '../../../../../tests/fixtures/claims-data';
import { claimsIn } from './claims';

/** One block as long as can be set, of a piece that goes on without an end. */
const long = (piece: string) => piece.repeat(Math.ceil(39_000 / piece.length));

describe('claims of a text that means no good', () => {
	it.each([
		['may be faster ', 'words that hedge'],
		['the tile render gains 9 %, ', 'claims without a full stop'],
		['from 3 to 4 s to 5 s ', 'ranges'],
		['1.2.3.4.5.6.7.8.', 'dots'],
		['12,345,678,901,234 ', 'thousands'],
		['1 234 567 890 ', 'spaces'],
		['twice a third of half the ', 'parts'],
		['9 % − + ± × 5 ', 'signs'],
		[':reading{workload=tile-render profile=stock} faster ', 'directives'],
		['((((((“““', 'brackets']
	])(
		'%j: %s',
		(piece) => {
			// Work that grew with the square of its length would not come to an end in the time a test has.
			expect(Array.isArray(claimsIn(long(piece), claimsData))).toBe(true);
		},
		60_000
	);
});
