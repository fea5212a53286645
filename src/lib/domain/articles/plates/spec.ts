import type { Verdict } from '../../bench/figures';
import type { Direction } from '../../bench/words';
import type { LadderSpec } from './ladder-spec';
import type { PlateBase } from './plate-base';
import type { SweepSpec } from './sweep-spec';

/** One bar. Figures at full precision in the plate's unit; texts as printed. */
export interface ScoreRow {
	profile: string;
	name: string;
	/** 0 is stock, in graphite; 1 the subject, in blue; then the further series. */
	series: number;
	value: number;
	ci95: [number, number] | null;
	mean: number;
	median: number;
	sd: number | null;
	n: number;
	printed: string;
	printedInterval: string | null;
}

export interface ScoresSpec extends PlateBase {
	kind: 'scores';
	workload: string;
	unit: string;
	better: Direction;
	/** Best first. */
	rows: ScoreRow[];
}

/** One dot of a gains plate. Percent. */
export interface GainPoint {
	profile: string;
	gainPercent: number;
	ci95: [number, number] | null;
	ratio: number;
	n: number;
	nBaseline: number;
	verdict: Verdict;
	printed: string;
	printedInterval: string | null;
}

export interface GainsRow {
	workload: string;
	name: string;
	/** The class of the workload. */
	kind: string;
	leastDifferencePercent: number;
	/** In the order of the series; null where there is nothing to compare. */
	points: (GainPoint | null)[];
}

export interface GainsSpec extends PlateBase {
	kind: 'gains';
	baseline: { profile: string; name: string };
	series: { profile: string; name: string; series: number }[];
	rows: GainsRow[];
}

/** All that a plate is drawn from: plain data, so that the same plate is drawn the same way everywhere. */
export type PlateSpec = ScoresSpec | GainsSpec | LadderSpec | SweepSpec;

export const plateKinds = [
	'scores',
	'gains',
	'ladder',
	'sweep'
] as const satisfies readonly PlateSpec['kind'][];

/** A 53-bit hash of a text, enough to tell the plates of an article apart; not for secrets. */
function hashOf(text: string): string {
	let high = 0xdeadbeef;
	let low = 0x41c6ce57;
	for (let index = 0; index < text.length; index++) {
		const code = text.charCodeAt(index);
		high = Math.imul(high ^ code, 2654435761);
		low = Math.imul(low ^ code, 1597334677);
	}
	high = Math.imul(high ^ (high >>> 16), 2246822507) ^ Math.imul(low ^ (low >>> 13), 3266489909);
	low = Math.imul(low ^ (low >>> 16), 2246822507) ^ Math.imul(high ^ (high >>> 13), 3266489909);
	return (4294967296 * (2097151 & low) + (high >>> 0)).toString(36).padStart(11, '0');
}

function subjectOf(spec: PlateSpec): string {
	if (spec.kind === 'scores') return spec.workload;
	if (spec.kind === 'gains') return `over-${spec.baseline.profile}`;
	return spec.kind === 'ladder' ? spec.ladder : spec.sweep;
}

/**
 * A plate's name: the same for the same figures, another for others. It is the key of the preview's drawings
 * and the name of the edition's files; at most 60 characters.
 * @example plateKey(spec) // 'scores-tile-render-0f3k2m9x1ab'
 */
export function plateKey(spec: PlateSpec): string {
	return `${spec.kind}-${subjectOf(spec).slice(0, 38).replace(/-+$/, '')}-${hashOf(JSON.stringify(spec))}`;
}
