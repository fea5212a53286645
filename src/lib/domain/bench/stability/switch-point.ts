import { mean, sampleStandardDeviation } from 'simple-statistics';
import { meanInterval } from '../statistics/interval';
import { positive } from '../tuning/positive';
import { type Fitted, fallingFit } from './falling-fit';
import { type Crossing, fallsUnder } from './monotone-interpolation';
import { switchAt } from './switch-at';

export interface CurrentPoint {
	currentA: number;
	clockMHz: number;
}

export interface SwitchPoint {
	kind: Crossing['kind'];
	/** Where the clock falls under the wanted one, in A; null unless it does. */
	crossingA: number | null;
	/** 95 % interval of it over the passes; null with fewer than two, or where one has no crossing. */
	ci95: [number, number] | null;
	/** What each pass says by itself, in the order given. */
	passes: Crossing[];
	/** The falling fit through all passes, to be drawn. */
	fit: Fitted[];
	/** Half the interval and one step of the board, in A; null where there is no crossing. */
	marginA: number | null;
	/** What to set, on the board's grid of steps; null where nothing can be advised. */
	setA: number | null;
}

const crossingOf = (fit: readonly Fitted[], wanted: number): Crossing =>
	fallsUnder(
		fit.map(({ currentA, clockMHz }) => ({ x: currentA, y: clockMHz })),
		wanted
	);

/**
 * The load current at which the clock of automatic boost falls under a wanted fixed clock. Each pass gets a falling
 * isotonic fit of its own, crossed by linear interpolation; the crossing is the mean over the passes and its interval
 * Student's t over them, since points of one pass share its heat and are no repeats of one another. Where the passes
 * do not agree that there is a crossing, the fit through all of them answers, without an interval. Nothing is guessed
 * beyond what was measured: the boost that never falls so low is 'not-reached', the one that begins under it
 * 'always-below'. The advice is common practice, no source.
 * RangeError without passes, for a pass with fewer than two currents, or for values that are not above zero.
 */
export function switchPoint(
	passes: readonly (readonly CurrentPoint[])[],
	{ wantedMHz, stepA }: { wantedMHz: number; stepA: number }
): SwitchPoint {
	positive(wantedMHz, 'wanted clock');
	positive(stepA, "board's step of current");
	if (passes.length === 0) throw new RangeError('A switch point needs at least one pass.');
	const fits = passes.map((pass) => fallingFit(pass));
	if (fits.some((fit) => fit.length < 2))
		throw new RangeError('Each pass needs points at two currents or more.');
	const each = fits.map((fit) => crossingOf(fit, wantedMHz));
	const fit = fallingFit(passes.flat());
	const crossings = each.flatMap((one) => (one.kind === 'crosses' ? [one.at] : []));
	const agreed = crossings.length === passes.length;
	const pooled = crossingOf(fit, wantedMHz);
	const crossingA = agreed ? mean(crossings) : pooled.kind === 'crosses' ? pooled.at : null;
	if (crossingA === null)
		return { kind: pooled.kind, crossingA, ci95: null, passes: each, fit, marginA: null, setA: null };
	const ci95 =
		agreed && crossings.length > 1
			? meanInterval(crossingA, sampleStandardDeviation(crossings), crossings.length)
			: null;
	return { kind: 'crosses', crossingA, ci95, passes: each, fit, ...switchAt(crossingA, ci95, stepA) };
}
