import { describe, expect, it } from 'vitest';
import { withNews, type MovingBoard, type WiredNews } from './board-news';
import type { CellFigures } from './figures';

const cell = (profile: string, needed: number) =>
	({ profile, workload: 'tile-render', needed }) as CellFigures;
const board: MovingBoard & { zone: string } = {
	tag: 'first',
	cells: [cell('stock', 5), cell('tuned', 5)],
	state: 'running',
	off: [{ profile: 'stock', workload: 'tile-render', words: 'off' }],
	progress: { taken: 1, needed: 10 },
	signed: 0,
	current: null,
	newest: 1,
	selected: { profile: 'stock', workload: 'tile-render', runs: [], baselineValues: null },
	may: { plan: false, record: true, sign: true },
	zone: 'UTC'
};
const run = {
	id: 1,
	version: 1,
	tester: 'Pelle',
	source: 'grid' as const,
	startedAt: '2026-11-11T08:00:00.000Z',
	ambientC: null,
	notes: '',
	voided: null,
	readings: []
};
const { cells: _cells, off: _off, ...moving } = board;
const news: WiredNews = {
	...moving,
	kind: 'changed',
	from: 'first',
	tag: 'second',
	cells: [{ at: 1, cell: cell('tuned', 6) }],
	selected: { profile: 'stock', workload: 'tile-render', runs: [run], baselineValues: null }
};

describe('a board with its news', () => {
	it('has the changed cells, keeps the others and what is not told, and has times again', () => {
		const after = withNews(board, news);
		expect(after?.tag).toBe('second');
		expect(after?.cells[0]).toBe(board.cells[0]);
		expect(after?.cells[1]?.needed).toBe(6);
		expect(after?.off).toBe(board.off);
		expect(after?.zone).toBe('UTC');
		expect(after?.selected.runs[0]?.startedAt).toEqual(new Date('2026-11-11T08:00:00Z'));
		expect(board.cells[1]?.needed).toBe(5);
		expect(after).not.toHaveProperty('kind');
	});

	it('forgets that the rig was off when it is told so', () => {
		expect(withNews(board, { ...news, off: [] })?.off).toEqual([]);
	});

	it('is none where they lead on from another board, or there is no way', () => {
		expect(withNews({ ...board, tag: 'other' }, news)).toBeNull();
		expect(withNews(board, { kind: 'anew' })).toBeNull();
	});
});
