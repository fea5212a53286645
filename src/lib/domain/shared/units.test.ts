import { describe, expect, it } from 'vitest';
import { kindOfWords, plainUnit, scaledUnit, unitOf, unitsOf } from './units';

describe('a unit', () => {
	// SciPy 1.17.1, scipy.constants: minute, hour, milli, micro, nano, kilo, mega, giga, tera, kibi, mebi, gibi and
	// degree_Fahrenheit; a watt hour is hour × 1 J. The definitions are the SI Brochure's (table 8) and IEC 80000-13's.
	it.each([
		['min', 'time', 60],
		['h', 'time', 3600],
		['ms', 'time', 0.001],
		['Wh', 'energy', 3600],
		['kWh', 'energy', 3_600_000],
		['μs', 'time', 1e-6],
		['ns', 'time', 1e-9],
		['kHz', 'frequency', 1000],
		['TB/s', 'throughput', 1e12],
		['KiB/s', 'throughput', 1024],
		['GiB/s', 'throughput', 1_073_741_824],
		['°F', 'temperature', 0.5555555555555556],
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
