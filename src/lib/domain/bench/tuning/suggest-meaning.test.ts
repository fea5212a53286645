import { describe, expect, it } from 'vitest';
import { suggestMeaning } from './suggest-meaning';

describe('what a name suggests', () => {
	// Common practice, no source: what these words mean in the trade.
	it.each([
		['Core group 2 ratio', 'core-ratio'],
		['Core multiplier', 'core-ratio'],
		['Vcore', 'core-voltage'],
		['CPU Core Voltage', 'core-voltage'],
		['CPU Voltage Offset', 'core-voltage'],
		['SoC voltage', 'soc-voltage'],
		['DRAM Voltage', 'memory-voltage'],
		['VDDQ', 'memory-io-voltage'],
		['CPU load-line', 'load-line'],
		['tCL', 'cas-latency'],
		['CAS# latency', 'cas-latency'],
		['CL', 'cas-latency'],
		['tRCD', 'row-to-column-delay'],
		['tRP', 'row-precharge'],
		['tRAS', 'row-active'],
		['tRC', 'row-cycle'],
		['tRFC', 'refresh-cycle'],
		['Command rate', 'command-rate'],
		['Base clock', 'reference-clock'],
		['Memory speed', 'memory-data-rate'],
		['Memory controller clock', 'memory-controller-clock'],
		['Fabric frequency', 'fabric-clock'],
		['Package power limit 1', 'power-limit'],
		['Core current limit', 'current-limit'],
		['Thermal limit', 'temperature-limit'],
		['Automatic boost', 'automatic-boost'],
		['Core clock', 'core-clock'],
		['Switching current', 'switch-current']
	])('%s: %s', (name, quantity) => {
		expect(suggestMeaning(name)?.quantity).toBe(quantity);
	});

	it('says what it was guessed from', () => {
		expect(suggestMeaning('Chiplet 1 Ratio')).toEqual({ quantity: 'core-ratio', from: 'Ratio' });
	});

	it.each(['', 'Fans', 'Fabric voltage', 'Clear the screen', 'Boost clock limit'])(
		'nothing for %j',
		(name) => {
			expect(suggestMeaning(name)).toBeNull();
		}
	);
});
