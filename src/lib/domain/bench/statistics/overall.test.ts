import { describe, expect, it } from 'vitest';
import { compareCells } from './compare';
import { overall } from './overall';

const of = (workload: string, ours: number, theirs: number) => ({
	workload,
	comparison: compareCells([ours, ours], [theirs, theirs], 'higher', 1)
});

describe('the overall figure', () => {
	it('is the geometric mean of the ratios', () => {
		const figure = overall([of('one', 200, 100), of('two', 50, 100)]);
		expect(figure?.ratio).toBeCloseTo(1, 14);
		expect(figure?.gainPercent).toBeCloseTo(0, 12);
		expect(figure).toMatchObject({ workloads: ['one', 'two'], missing: [] });
	});

	it('says which workloads are not in it', () => {
		const figure = overall([of('one', 121, 100), { workload: 'two', comparison: null }]);
		expect(figure).toEqual({
			ratio: expect.closeTo(1.21, 12) as unknown,
			gainPercent: expect.closeTo(21, 10) as unknown,
			workloads: ['one'],
			missing: ['two']
		});
	});

	it('is none without a ratio', () => {
		expect(overall([])).toBeNull();
		expect(overall([{ workload: 'one', comparison: null }])).toBeNull();
	});
});
