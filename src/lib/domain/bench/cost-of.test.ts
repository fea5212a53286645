import { describe, expect, it } from 'vitest';
import { unitsOf } from '../shared/units';
import { costOf } from './cost-of';

describe('what a unit costs', () => {
	// W, J, K, °C, A and V are symbols of the SI Brochure, which the table of units names with its checks; the sone of
	// loudness (ISO 532) and the spellings are common practice, no source.
	it.each([
		['W', 'power'],
		['kW', 'power'],
		['watts', 'power'],
		['J', 'energy'],
		['Wh', 'energy'],
		['°C', 'temperature'],
		['K', 'temperature'],
		['dB(A)', 'noise'],
		['sone', 'noise'],
		['A', 'current'],
		['mA', 'current'],
		['V', 'voltage'],
		['mV', 'voltage'],
		['EUR', 'money'],
		['€', 'money'],
		['J/frame', 'energy'],
		['Wh per run', 'energy'],
		['K/W', 'temperature'],
		['EUR/month', 'money']
	])('%s is of %s', (unit, kind) => {
		expect(costOf(unit)).toBe(kind);
	});

	it.each(['points/W', 'frames/J', 'points per watt', 'points/EUR', 'frames/s/W'])(
		'%s is of value: performance for a cost',
		(unit) => {
			expect(costOf(unit)).toBe('value');
		}
	);

	it.each([
		's',
		'ns',
		'frames/s',
		'GB/s',
		'MB/s',
		'points',
		'',
		'kpoints',
		'K points',
		'words/s',
		'events/s'
	])('%s is of performance', (unit) => {
		expect(costOf(unit)).toBeNull();
	});

	it('takes every known score, rate and time for performance, and no other known unit', () => {
		const performance = (['time', 'frequency', 'throughput', 'frame-rate', 'score'] as const).flatMap(
			(kind) => unitsOf(kind)
		);
		expect(unitsOf().filter((unit) => costOf(unit) === null)).toEqual(performance);
	});
});
