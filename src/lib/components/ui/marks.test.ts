import { describe, expect, it } from 'vitest';
import { stages } from '../../domain/articles/stage';
import { kinds, shapes, type MarkKind } from './marks';
import { stageMarks } from './stage-marks';

describe('marks', () => {
	it('never differ by colour alone', () => {
		const inks = new Map<string, Set<string>>();
		for (const { shape, ink } of Object.values(kinds))
			inks.set(shape, (inks.get(shape) ?? new Set()).add(ink));
		const ambiguous = [...inks].filter(([, all]) => all.size > 1).map(([shape]) => shape);
		expect(ambiguous).toEqual([]);
	});
	it('give each stage a shape of its own', () => {
		const drawn = stages.map((stage) => kinds[stageMarks[stage]].shape);
		expect(new Set(drawn).size).toBe(stages.length);
	});
	it('have a drawing for each kind', () => {
		for (const kind of Object.keys(kinds) as MarkKind[]) expect(shapes[kinds[kind].shape].path).not.toBe('');
	});
});
