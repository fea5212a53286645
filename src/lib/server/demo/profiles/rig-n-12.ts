import type { Row, Tree } from './tree';

const clocks = 'Tuning > Clocks';
const volts = 'Tuning > Voltages';
const limits = 'Tuning > Limits';
const boost = 'Tuning > Boost';
const memory = 'Tuning > Memory';
const fans = 'Cooling > Fans';

const ratio = (value: string): Row => [clocks, 'Core ratio, all cores', value, '×', 'core-ratio'];
const open: Row[] = [
	[limits, 'Package power limit', '230', 'W', 'power-limit'],
	[limits, 'Core current limit', '190', 'A', 'current-limit']
];

/** The main rig: four ways to spend sixteen cores, and two settings of the fans. */
export const rigN12: Tree = {
	rig: 'n-12',
	day: -44,
	who: 'Tomas',
	stock: {
		notes:
			'As the board sets it after a reset, with the memory at its rated profile. Read off the machine, not off the box.',
		rows: [
			[clocks, 'Reference clock', '100', 'MHz', 'reference-clock'],
			[
				clocks,
				'Core ratio, all cores',
				'44',
				'×',
				'core-ratio',
				'The base. The board boosts above it by itself.'
			],
			[volts, 'Core voltage', '1.17', 'V', 'core-voltage'],
			[volts, 'Load line', 'Level 3', '', 'load-line'],
			[limits, 'Package power limit', '170', 'W', 'power-limit'],
			[limits, 'Core current limit', '140', 'A', 'current-limit'],
			[limits, 'Temperature limit', '90', '°C', 'temperature-limit'],
			[boost, 'Automatic boost', 'Standard', '', 'other'],
			[boost, 'Change over to fixed clock', 'Off', '', 'other'],
			[memory, 'Memory data rate', '6000', 'MT/s', 'memory-data-rate'],
			[memory, 'CAS latency', '36', '', 'cas-latency'],
			[memory, 'Memory voltage', '1.35', 'V', 'memory-voltage'],
			[memory, 'Memory controller clock', '3000', 'MHz', 'memory-controller-clock'],
			[memory, 'Fabric clock', '2000', 'MHz', 'fabric-clock'],
			[fans, 'Radiator fans', 'Standard curve', '', 'other'],
			[fans, 'Pump', 'Standard curve', '', 'other']
		]
	},
	profiles: [
		{
			slug: 'automatic-boost',
			name: 'Automatic boost',
			notes: 'Only the limits are raised. The board does the rest, and keeps its own watch over temperature.',
			rows: [...open, [boost, 'Automatic boost', 'Raised', '', 'other']]
		},
		{
			slug: 'fixed-470',
			name: 'Fixed 4.70, heaviest stress',
			notes: 'The highest clock that stood the heaviest loop below stock voltage for a night.',
			rows: [
				ratio('47'),
				[volts, 'Core voltage', '1.155', 'V', 'core-voltage', 'Below stock.'],
				...open,
				[boost, 'Automatic boost', 'Off', '', 'other']
			]
		},
		{
			slug: 'fixed-495',
			name: 'Fixed 4.95, everyday',
			parent: 'fixed-470',
			notes:
				'For loads that people run. The heaviest loop reaches the temperature limit with it and is no part of everyday.',
			rows: [
				ratio('49.5'),
				[
					volts,
					'Core voltage',
					'1.24',
					'V',
					'core-voltage',
					'Raise it in steps of 10 mV and stop where a step brings nothing.'
				],
				[volts, 'Load line', 'Level 4', '', 'load-line'],
				[limits, 'Temperature limit', '85', '°C', 'temperature-limit', 'Lower than stock, on purpose.']
			]
		},
		{
			slug: 'switching-78',
			name: 'Switching at 78 A',
			parent: 'fixed-495',
			notes: 'Below the current the board boosts as it likes; above it the fixed clock holds.',
			rows: [
				[boost, 'Automatic boost', 'Raised', '', 'other'],
				[boost, 'Change over to fixed clock', 'By load current', '', 'other'],
				[
					boost,
					'Change over above',
					'78',
					'A',
					'switch-current',
					'Where the boost clock falls under the fixed one.'
				]
			]
		},
		{
			slug: 'fans-quiet',
			name: 'Quiet fans',
			notes: '',
			rows: [
				[fans, 'Radiator fans', 'Fixed at 40 %', '', 'other'],
				[fans, 'Pump', 'Fixed at 60 %', '', 'other']
			]
		},
		{
			slug: 'fans-full',
			name: 'Full fans',
			notes: '',
			rows: [
				[fans, 'Radiator fans', 'Fixed at 100 %', '', 'other'],
				[fans, 'Pump', 'Fixed at 100 %', '', 'other']
			]
		}
	]
};
