import type { Tree } from './tree';

const clocks = 'Advanced > Processor';
const limits = 'Advanced > Processor > Limits';
const memory = 'Advanced > Memory';
const timings = 'Advanced > Memory > Timings';
const fans = 'Monitor > Fans';
const power = 'Advanced > Power';

/** The small rig: memory by its rating, by hand and out of step; a second fan; sleep; and a processor still to be measured. */
export const rigM4: Tree = {
	rig: 'm-4',
	day: -43,
	who: 'Pelle',
	stock: {
		notes: 'After a reset. The board runs the memory at its base rate until somebody asks for more.',
		rows: [
			[clocks, 'Reference clock', '100', 'MHz', 'reference-clock'],
			[clocks, 'Core ratio, all cores', '42', '×', 'core-ratio'],
			[clocks, 'Core voltage', '1.12', 'V', 'core-voltage'],
			[limits, 'Package power limit', '88', 'W', 'power-limit'],
			[limits, 'Core current limit', '75', 'A', 'current-limit'],
			[limits, 'Temperature limit', '90', '°C', 'temperature-limit'],
			[memory, 'Memory data rate', '4800', 'MT/s', 'memory-data-rate'],
			[memory, 'Memory voltage', '1.10', 'V', 'memory-voltage'],
			[memory, 'Memory controller clock', '2400', 'MHz', 'memory-controller-clock'],
			[memory, 'Fabric clock', '1800', 'MHz', 'fabric-clock'],
			[timings, 'CAS latency', '40', '', 'cas-latency'],
			[timings, 'Row cycle time', '117', 'clocks', 'other'],
			[timings, 'Refresh interval', '9360', 'clocks', 'other'],
			[power, 'Sleep depth at idle', 'Standard', '', 'other'],
			[fans, 'Fan 1', 'Standard curve', '', 'other'],
			[fans, 'Fan 2', 'Off', '', 'other']
		]
	},
	profiles: [
		{
			slug: 'rated-6000',
			name: 'Rated 6000',
			notes: 'What the label promises, read from the kit by the board.',
			rows: [
				[memory, 'Memory data rate', '6000', 'MT/s', 'memory-data-rate'],
				[memory, 'Memory voltage', '1.35', 'V', 'memory-voltage'],
				[memory, 'Memory controller clock', '3000', 'MHz', 'memory-controller-clock'],
				[memory, 'Fabric clock', '2000', 'MHz', 'fabric-clock'],
				[timings, 'CAS latency', '36', '', 'cas-latency'],
				[timings, 'Row cycle time', '132', 'clocks', 'other']
			]
		},
		{
			slug: 'by-hand-6000',
			name: '6000 by hand',
			parent: 'rated-6000',
			notes:
				'The rated rate, with the timings brought down one at a time and a pass of the memory test between.',
			rows: [
				[
					memory,
					'Memory voltage',
					'1.38',
					'V',
					'memory-voltage',
					'Feel for warm air at the modules; give them a fan if there is none.'
				],
				[memory, 'Fabric clock', '2100', 'MHz', 'fabric-clock'],
				[timings, 'CAS latency', '30', '', 'cas-latency'],
				[
					timings,
					'Row cycle time',
					'96',
					'clocks',
					'other',
					'The one that costs most passes. Go up by eight if the test finds anything.'
				],
				[
					timings,
					'Refresh interval',
					'32768',
					'clocks',
					'other',
					'Longer is faster and wants cooler modules.'
				]
			]
		},
		{
			slug: 'half-6800',
			name: '6800, controller at half',
			parent: 'rated-6000',
			notes: 'The controller cannot follow, so the board runs it at half the memory’s clock.',
			rows: [
				[memory, 'Memory data rate', '6800', 'MT/s', 'memory-data-rate'],
				[memory, 'Memory voltage', '1.40', 'V', 'memory-voltage'],
				[memory, 'Memory controller clock', '1700', 'MHz', 'memory-controller-clock'],
				[timings, 'CAS latency', '38', '', 'cas-latency'],
				[timings, 'Row cycle time', '150', 'clocks', 'other']
			]
		},
		{
			slug: 'second-fan',
			name: 'Second fan',
			notes: 'It is mounted in both profiles; under stock it stands still.',
			rows: [[fans, 'Fan 2', 'As fan 1', '', 'other']]
		},
		{
			slug: 'deep-idle',
			name: 'Deep idle',
			notes: '',
			rows: [[power, 'Sleep depth at idle', 'Deepest', '', 'other']]
		},
		{
			slug: 'limits-raised',
			name: 'Limits raised',
			notes: 'Only the limits. To be measured.',
			rows: [
				[limits, 'Package power limit', '120', 'W', 'power-limit'],
				[limits, 'Core current limit', '95', 'A', 'current-limit']
			]
		},
		{
			slug: 'fixed-480',
			name: 'Fixed 4.80',
			parent: 'limits-raised',
			notes: 'To be proven stable before it is measured.',
			rows: [
				[clocks, 'Core ratio, all cores', '48', '×', 'core-ratio'],
				[clocks, 'Core voltage', '1.19', 'V', 'core-voltage']
			]
		}
	]
};
