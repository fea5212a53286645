import type { Campaign } from './measured';

/** A graphics card at three power limits, and at one of them with a lower voltage. */
export const powerLimits: Campaign = {
	slug: 'marlow-g70-power-limits',
	name: 'Marlow G70, three power limits',
	rig: 'g-2',
	purpose: 'How many frames a watt buys at the top of the range, and what a lower voltage gives back.',
	plannedOn: -12,
	plannedBy: 'Tomas',
	dueOn: -3,
	repeats: 6,
	stock: { 'frame-walk': 231, 'lantern-street': 142, 'frame-energy': 2.241 },
	gains: {
		'limit-280': { 'frame-walk': -0.5, 'lantern-street': -0.7, 'frame-energy': 12.6 },
		'limit-240': { 'frame-walk': -5.2, 'lantern-street': -4.8, 'frame-energy': 26.4 },
		'limit-200': { 'frame-walk': -13.1, 'lantern-street': -14.2, 'frame-energy': 36.8 },
		'low-240': { 'frame-walk': -0.9, 'lantern-street': -1, 'frame-energy': 31.5 }
	},
	way: 'script',
	sittings: [
		{ profile: 'stock', day: -11, who: 'Tomas' },
		{ profile: 'limit-280', day: -10, who: 'Tomas' },
		{ profile: 'limit-240', day: -10, from: '13:00', who: 'Pelle' },
		{ profile: 'limit-200', day: -9, who: 'Tomas' },
		{ profile: 'low-240', day: -8, who: 'Tomas' }
	],
	odd: {
		'low-240/lantern-street': { notes: 'One step lower the driver restarted; this one ran the night.' }
	},
	signed: [{ day: -7, time: '09:30', who: 'Tomas' }]
};
