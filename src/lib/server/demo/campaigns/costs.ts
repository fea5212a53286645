import type { Campaign } from './measured';

/** What two of the four ways cost in power, heat and noise. */
export const costs: Campaign = {
	slug: 'aldermoor-1650-costs',
	name: 'Aldermoor 1650, what it costs',
	rig: 'n-12',
	purpose: 'What a fixed clock gives up for what it gains: draw at the wall, heat and noise beside the work.',
	plannedOn: -34,
	plannedBy: 'Tomas',
	dueOn: -30,
	repeats: 5,
	stock: {
		'prime-sieve': 24.6,
		'tile-render': 35.1,
		'video-encode': 61.5,
		'frame-walk': 143,
		'render-draw': 212,
		'heat-soak': 41,
		loudness: 1.92
	},
	gains: {
		'automatic-boost': {
			'prime-sieve': 1.9,
			'tile-render': 6.2,
			'video-encode': 5.1,
			'frame-walk': 0.7,
			'render-draw': -13,
			'heat-soak': -8,
			loudness: -4
		},
		'fixed-495': {
			'prime-sieve': -4.6,
			'tile-render': 12.4,
			'video-encode': 14.8,
			'frame-walk': -0.6,
			'render-draw': -21,
			'heat-soak': -17,
			loudness: -22
		}
	},
	way: 'script',
	sittings: [
		{ profile: 'stock', day: -33, who: 'Tomas' },
		{ profile: 'automatic-boost', day: -32, who: 'Tomas' },
		{ profile: 'fixed-495', day: -31, who: 'Tomas' }
	],
	signed: [{ day: -30, time: '09:10', who: 'Tomas' }]
};
