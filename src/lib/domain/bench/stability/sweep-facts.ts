import { type SwitchPoint, switchPoint } from './switch-point';
import { switchWords } from './switch-words';
import type { SweepPoint } from './thread-sweep';

export interface SweepPass {
	number: number;
	/** ISO time. */
	startedAt: string;
	points: SweepPoint[];
}

/** A sweep with the passes that stand: plain data, for screens and for articles. */
export interface SweepFacts {
	slug: string;
	name: string;
	rig: { slug: string; name: string; revision: number };
	profile: { slug: string; name: string };
	workload: { slug: string; name: string };
	/** The fixed clock the board would change to. */
	wantedMHz: number;
	/** The board's step of current. */
	stepA: number;
	passes: SweepPass[];
}

/** The switch point of a sweep and its words; null before the first pass. */
export function sweepReport({
	passes,
	wantedMHz,
	stepA
}: Pick<SweepFacts, 'passes' | 'wantedMHz' | 'stepA'>): { point: SwitchPoint; words: string } | null {
	if (passes.length === 0) return null;
	const point = switchPoint(
		passes.map((pass) => pass.points),
		{ wantedMHz, stepA }
	);
	return { point, words: switchWords(point, wantedMHz) };
}
