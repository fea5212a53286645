import type { Campaign } from './measured';

/** The main campaign: four profiles against stock, fully measured and signed. */
export const fourWays: Campaign = {
	slug: 'aldermoor-1650-four-ways',
	name: 'Aldermoor 1650, four ways',
	rig: 'n-12',
	purpose:
		'What a fixed clock gains and loses against stock, and whether changing over by current gives the best of both.',
	plannedOn: -43,
	plannedBy: 'Tomas',
	dueOn: -30,
	repeats: 7,
	stock: {
		'prime-sieve': 24.6,
		'tile-render': 35.1,
		'source-build': 234,
		'video-encode': 61.5,
		'archive-pack': 812,
		'frame-walk': 143
	},
	gains: {
		'automatic-boost': {
			'prime-sieve': 1.9,
			'tile-render': 6.2,
			'source-build': 4.4,
			'video-encode': 5.1,
			'archive-pack': 4.7,
			'frame-walk': 0.7
		},
		'fixed-470': {
			'prime-sieve': -9.4,
			'tile-render': 6.7,
			'source-build': 3.8,
			'video-encode': 9,
			'archive-pack': 3.1,
			'frame-walk': -1.1
		},
		'fixed-495': {
			'prime-sieve': -4.6,
			'tile-render': 12.4,
			'source-build': 9,
			'video-encode': 14.8,
			'archive-pack': 8.2,
			'frame-walk': -0.6
		},
		'switching-78': {
			'prime-sieve': 1.8,
			'tile-render': 12.1,
			'source-build': 8.7,
			'video-encode': 14.5,
			'archive-pack': 8,
			'frame-walk': 0.5
		}
	},
	way: 'grid',
	sittings: [
		{ profile: 'stock', day: -40, who: 'Tomas' },
		{ profile: 'automatic-boost', day: -39, who: 'Tomas' },
		{ profile: 'fixed-470', day: -38, who: 'Tomas' },
		{ profile: 'fixed-495', day: -37, who: 'Tomas' },
		{ profile: 'switching-78', day: -36, who: 'Tomas' }
	],
	odd: {
		'stock/frame-walk': { notes: 'Level loaded afresh before each walk, as the method says.' },
		'fixed-495/tile-render': { notes: 'Hottest core 79 °C.' },
		'switching-78/prime-sieve': { notes: 'Board did not change over once: current under 40 A throughout.' }
	},
	signed: [{ day: -35, time: '10:20', who: 'Tomas' }]
};

const taken = (n: number) => ({ n });
const none = { readings: [] };

/** The same after a change of firmware: half done, with a reading that stands far from the others. */
export const newFirmware: Campaign = {
	slug: 'aldermoor-1650-firmware-2-20',
	name: 'Aldermoor 1650, firmware 2.20',
	rig: 'n-12',
	purpose: 'The five profiles again under firmware 2.20. If the verdicts stand, the guide stands.',
	plannedOn: -5,
	plannedBy: 'Tomas',
	dueOn: 6,
	repeats: 7,
	stock: {
		'prime-sieve': 24.4,
		'tile-render': 35,
		'source-build': 234.2,
		'video-encode': 61.7,
		'frame-walk': 143.4
	},
	gains: {
		'automatic-boost': {
			'prime-sieve': 2.4,
			'tile-render': 6,
			'source-build': 4.6,
			'video-encode': 5.3,
			'frame-walk': 0.4
		},
		'fixed-470': { 'prime-sieve': -10.1, 'tile-render': 6.5 },
		'fixed-495': { 'prime-sieve': -5.3, 'tile-render': 12.1 },
		'switching-78': {}
	},
	way: 'grid',
	sittings: [
		{ profile: 'stock', day: -4, who: 'Tomas' },
		{ profile: 'automatic-boost', day: -3, who: 'Tomas' },
		{ profile: 'fixed-470', day: -2, from: '13:30', who: 'Pelle' },
		{ profile: 'fixed-495', day: -1, from: '13:05', who: 'Tomas' }
	],
	odd: {
		'automatic-boost/frame-walk': { ...taken(5), notes: 'Two walks to go: the room was needed.' },
		'fixed-470/tile-render': taken(2),
		'fixed-470/source-build': none,
		'fixed-470/video-encode': none,
		'fixed-470/frame-walk': none,
		'fixed-495/tile-render': taken(6),
		'fixed-495/source-build': {
			readings: [214.6, 213.9, 215.2, 236.8, 214.1, 214.8],
			notes:
				'Fourth build as slow as stock. Did the board lose the profile over the restart? Check before signing.'
		},
		'fixed-495/video-encode': none,
		'fixed-495/frame-walk': none
	},
	signed: [
		{
			day: -3,
			time: '08:50',
			who: 'Tomas',
			cells: ['stock/prime-sieve', 'stock/tile-render', 'stock/source-build', 'stock/video-encode']
		},
		{ day: -2, time: '09:15', who: 'Tomas', cells: ['automatic-boost/prime-sieve'] }
	]
};

/** Planned, and nothing measured yet. */
export const eightCores: Campaign = {
	slug: 'aldermoor-1430-limits',
	name: 'Aldermoor 1430, limits and a fixed clock',
	rig: 'm-4',
	purpose: 'Whether eight cores gain from what sixteen gained from, on a board with half the phases.',
	plannedOn: -2,
	plannedBy: 'Pelle',
	dueOn: 12,
	repeats: 7,
	stock: {
		'prime-sieve': 0,
		'tile-render': 0,
		'source-build': 0,
		'video-encode': 0,
		'archive-pack': 0,
		'heat-soak': 0
	},
	gains: { 'limits-raised': {}, 'fixed-480': {} },
	way: 'grid',
	sittings: [],
	signed: []
};
