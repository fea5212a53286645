import { describe, expect, it } from 'vitest';
import type { Overall } from './figures';
import { overallWords } from './overall-words';

const workloads = [
	{ slug: 'tile-render', name: 'Tile render', unit: 's' },
	{ slug: 'frame-walk', name: 'Frame walk', unit: 'frames/s' },
	{ slug: 'idle-draw', name: 'Idle draw', unit: 'W' },
	{ slug: 'loudness', name: 'Loudness', unit: 'sone' }
];
const figure = (change: Partial<Overall> = {}): Overall => ({
	ratio: 1.1,
	gainPercent: 10,
	workloads: ['tile-render', 'frame-walk'],
	missing: [],
	aside: [
		{ workload: 'idle-draw', cost: 'power' },
		{ workload: 'loudness', cost: 'noise' }
	],
	...change
});

describe('what an overall figure rests on', () => {
	it('is said with what is left out and why', () => {
		expect(overallWords([{ name: 'Tuned', figure: figure() }], workloads)).toEqual([
			'The overall figure rests on performance alone: Tile render and Frame walk.',
			'Left out: Idle draw (power) and Loudness (noise). They measure what a profile costs, which is no part of how fast it is.'
		]);
	});

	it('names the profiles that lack a workload, those that lack the same together', () => {
		const short = figure({ workloads: ['tile-render'], missing: ['frame-walk'], aside: [] });
		const said = overallWords(
			[
				{ name: 'Tuned', figure: figure({ aside: [] }) },
				{ name: 'By hand', figure: short },
				{ name: 'Fixed', figure: short }
			],
			workloads
		);
		expect(said).toEqual([
			'The overall figure rests on performance alone: Tile render and Frame walk.',
			'By hand and Fixed are without Frame walk, for want of readings on a side or of a ratio.'
		]);
	});

	it('claims nothing of a figure from before costs were left out', () => {
		const { aside: _, ...old } = figure({ workloads: ['tile-render', 'idle-draw'] });
		expect(overallWords([{ name: 'Tuned', figure: old }], workloads)).toEqual([
			'The overall figure rests on Tile render and Idle draw.'
		]);
	});

	it('says why there is none where only costs were measured', () => {
		expect(overallWords([], workloads.slice(2))).toEqual([
			'There is no overall figure: no workload here measures performance, only Idle draw (power) and Loudness (noise).'
		]);
		expect(overallWords([], workloads)).toEqual([]);
	});
});
