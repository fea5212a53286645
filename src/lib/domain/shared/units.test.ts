import { describe, expect, it } from 'vitest';
import { kindOfWords, plainUnit, scaledUnit, unitOf, unitsOf } from './units';

describe('a unit', () => {
	// SI Brochure 9th edition, table 8: 1 min = 60 s, 1 h = 3600 s; 1 W·h = 3.6 kJ follows. IEC 80000-13: Mi = 1 048 576.
	it.each([
		['min', 'time', 60],
		['h', 'time', 3600],
		['ms', 'time', 0.001],
		['Wh', 'energy', 3600],
		['MiB/s', 'throughput', 1_048_576],
		['MB/s', 'throughput', 1_000_000],
		['GHz', 'frequency', 1e9]
	])('%s is %s, %d of its base', (unit, kind, factor) => {
		expect(unitOf(unit)).toEqual({ kind, factor });
	});

	it('is not known for what a program counts', () => {
		expect(unitOf('events/s')).toBeNull();
		expect(unitOf('parsec')).toBeNull();
	});

	it('is one whichever letter mu is typed with', () => {
		expect(plainUnit(' \u00b5s ')).toBe('\u03bcs');
		expect(unitOf('\u00b5s')).toEqual(unitOf('\u03bcs'));
	});

	it('has words for each kind', () => {
		const kinds = new Set(unitsOf().flatMap((unit) => unitOf(unit)?.kind ?? []));
		for (const kind of kinds) expect(kindOfWords(kind)).toMatch(/^an? /);
		expect(unitsOf('voltage')).toEqual(['V', 'mV']);
	});

	it('has a smaller or greater brother where the scale is proportional', () => {
		expect(scaledUnit('s', 1000)).toBe('ms');
		expect(scaledUnit('GB/s', 1000)).toBe('MB/s');
		expect(scaledUnit('W', 1 / 1000)).toBe('kW');
		expect(scaledUnit('°C', 1000)).toBeNull();
		expect(scaledUnit('dB(A)', 1000)).toBeNull();
		expect(scaledUnit('frames/s', 1000)).toBeNull();
	});
});
