import { describe, expect, it } from 'vitest';
import { changeWords, type BoardChange } from './live-words';

const names = {
	profiles: [{ slug: 'stock', name: 'Stock' }],
	workloads: [{ slug: 'tile-render', name: 'Tile render' }]
};
const change = (more: Partial<BoardChange> = {}): BoardChange => ({
	id: 1,
	who: 'Pelle',
	mine: false,
	act: 'run.record',
	cell: 'stock/tile-render',
	readings: 1,
	...more
});

describe('what others changed', () => {
	it('is told together for a person and a cell, the newest first', () => {
		expect(
			changeWords(
				[
					change(),
					change({ id: 2, act: 'cell.sign', readings: 0, who: 'Ada' }),
					change({ id: 3 }),
					change({ id: 4, act: 'campaign.extend', cell: '', who: 'Ada' })
				],
				names
			)
		).toEqual([
			'Ada changed the plan.',
			'Pelle entered 2 readings in Stock · Tile render.',
			'Ada signed Stock · Tile render.'
		]);
	});

	it('leaves out what the watcher did, and names a cell by its slugs where it is new', () => {
		expect(changeWords([change({ mine: true }), change({ cell: 'by-hand/unpack' })], names)).toEqual([
			'Pelle entered 1 reading in by-hand · unpack.'
		]);
		expect(changeWords([change({ act: 'cell.unsign' })], names)).toEqual([
			'Pelle took the signature off Stock · Tile render.'
		]);
	});
});
