import type { Row, Tree } from './tree';

const power = 'Marlow Console > Card > Power';
const clock = 'Marlow Console > Card > Clock';

const limit = (value: string): Row => [power, 'Board power limit', value, 'W', 'power-limit'];

/** The graphics rig: the same card at three power limits, and once with a lower voltage. */
export const rigG2: Tree = {
	rig: 'g-2',
	day: -12,
	who: 'Tomas',
	stock: {
		notes:
			'As the driver sets it. Everything here is set in the maker’s program, not in the board’s firmware.',
		rows: [
			[power, 'Board power limit', '320', 'W', 'power-limit'],
			[power, 'Temperature limit', '88', '°C', 'temperature-limit'],
			[clock, 'Core clock', '2500', 'MHz', 'core-clock'],
			[clock, 'Core voltage', '0.950', 'V', 'core-voltage'],
			[clock, 'Fans', 'Standard curve', '', 'other']
		]
	},
	profiles: [
		{ slug: 'limit-280', name: '280 W', notes: '', rows: [limit('280')] },
		{ slug: 'limit-240', name: '240 W', notes: '', rows: [limit('240')] },
		{ slug: 'limit-200', name: '200 W', notes: '', rows: [limit('200')] },
		{
			slug: 'low-240',
			name: '240 W, lower voltage',
			parent: 'limit-240',
			notes: 'The same limit spent better: less voltage at nearly the same clock.',
			rows: [
				[clock, 'Core clock', '2450', 'MHz', 'core-clock'],
				[
					clock,
					'Core voltage',
					'0.875',
					'V',
					'core-voltage',
					'In steps of 10 mV down; a picture that tears or a driver that restarts is one step too far.'
				]
			]
		}
	]
};
