import type { Verdict } from '../../bench/figures';
import type { ValueKind } from '../../bench/value-figures';
import type { Direction } from '../../bench/words';
import type { DriftSpec } from './drift-spec';
import type { LadderSpec } from './ladder-spec';
import type { PlateBase } from './plate-base';
import type { SweepSpec } from './sweep-spec';

/** One bar. Figures at full precision in the plate's unit; texts as printed. */
export interface BarRow {
	profile: string;
	name: string;
	/** 0 is stock, in graphite; 1 the subject, in blue; then the further series. */
	series: number;
	value: number;
	ci95: [number, number] | null;
	n: number;
	printed: string;
	printedInterval: string | null;
}

export interface ScoreRow extends BarRow {
	mean: number;
	median: number;
	sd: number | null;
}

/** Bars from nought. */
export interface BarsSpec<Row extends BarRow = BarRow> extends PlateBase {
	workload: string;
	unit: string;
	better: Direction;
	/** Best first. */
	rows: Row[];
}

export interface ScoresSpec extends BarsSpec<ScoreRow> {
	kind: 'scores';
}

/** A figure made of two: score for each watt or each unit of money, energy of a task. */
export interface ValueSpec extends BarsSpec {
	kind: 'value';
	per: ValueKind;
	/** What it is made from, in words. */
	how: string;
	/** The workloads whose readings it rests on. */
	from: string[];
}

/** One dot of a gains plate. Percent. */
export interface GainPoint {
	profile: string;
	gainPercent: number;
	ci95: [number, number] | null;
	ratio: number;
	n: number;
	nBaseline: number;
	/** Null for a mean of several workloads, which has none. */
	verdict: Verdict | null;
	printed: string;
	printedInterval: string | null;
}

export interface GainsRow {
	/** Slug of the workload, or a name of several of them. */
	workload: string;
	name: string;
	/** The class of the workload. */
	kind: string;
	/** Null where nothing says how much matters. */
	leastDifferencePercent: number | null;
	/** In the order of the series; null where there is nothing to compare. */
	points: (GainPoint | null)[];
}

/** Dots with whiskers on a zero line. */
export interface DotsSpec extends PlateBase {
	baseline: { profile: string; name: string };
	series: { profile: string; name: string; series: number }[];
	rows: GainsRow[];
}

export interface GainsSpec extends DotsSpec {
	kind: 'gains';
}

/** Geometric means over all workloads of a campaign: one row. */
export interface OverallSpec extends DotsSpec {
	kind: 'overall';
	/** Workloads that went into it. */
	workloads: string[];
}

/** Geometric means by class of work, and what the profiles cost where a ratio says it. */
export interface TradeOffSpec extends DotsSpec {
	kind: 'trade-off';
	/** Workloads behind the rows. */
	workloads: string[];
}

/** All that a plate is drawn from: plain data, so that the same plate is drawn the same way everywhere. */
export type PlateSpec =
	ScoresSpec | GainsSpec | OverallSpec | ValueSpec | TradeOffSpec | DriftSpec | LadderSpec | SweepSpec;

export const plateKinds = [
	'scores',
	'gains',
	'overall',
	'value',
	'trade-off',
	'drift',
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
	switch (spec.kind) {
		case 'scores':
			return spec.workload;
		case 'value':
			return `${spec.workload}-per-${spec.per}`;
		case 'drift':
			return `${spec.rig}-${spec.workload}`;
		case 'ladder':
			return spec.ladder;
		case 'sweep':
			return spec.sweep;
		default:
			return `over-${spec.baseline.profile}`;
	}
}

/** A specification is never changed once made, so its name is computed once. */
const keys = new WeakMap<PlateSpec, string>();

/**
 * A plate's name: the same for the same figures, another for others. It is the key of the preview's drawings
 * and the name of the edition's files; at most 60 characters.
 * @example plateKey(spec) // 'scores-tile-render-0f3k2m9x1ab'
 */
export function plateKey(spec: PlateSpec): string {
	const known = keys.get(spec);
	if (known !== undefined) return known;
	const key = `${spec.kind}-${subjectOf(spec).slice(0, 38).replace(/-+$/, '')}-${hashOf(JSON.stringify(spec))}`;
	keys.set(spec, key);
	return key;
}
