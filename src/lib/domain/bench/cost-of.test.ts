import { describe, expect, it } from 'vitest';
import { costOf } from './cost-of';

describe('what a unit costs', () => {
	// Symbols of the SI Brochure (9th edition, tables 2 and 4) and of ISO 131 for loudness; from memory.
	it.each([
		['W', 'power'],
		['kW', 'power'],
		['J', 'energy'],
		['Wh', 'energy'],
		['°C', 'temperature'],
		['K', 'temperature'],
		['dB(A)', 'noise'],
		['sone', 'noise']
	])('%s is of %s', (unit, kind) => {
		expect(costOf(unit)).toBe(kind);
	});
	it.each(['s', 'ns', 'frames/s', 'GB/s', 'MB/s', 'points', '', 'kpoints', 'words/s'])(
		'%s is of a score',
		(unit) => {
			expect(costOf(unit)).toBeNull();
		}
	);
});
