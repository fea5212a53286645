import { positive } from '../tuning/positive';
import { leastSquares, type LineFit, predictAt, type Predicted } from './ols';

export interface PowerPoint {
	clockMHz: number;
	/** Core voltage under that load. */
	volts: number;
	packageW: number;
}

export interface PowerFit {
	n: number;
	/** What stays when nothing switches, as far as the line can tell, in W; with its standard error. */
	baseW: number;
	baseSeW: number;
	/** W for each V²·GHz, with its standard error. */
	wPerV2GHz: number;
	wPerV2GHzSe: number;
	residualSdW: number;
	/** Null where power does not vary. */
	rSquared: number | null;
	/** Measured less fitted, in the order given. */
	residualsW: number[];
	/** Range of V²·GHz that was measured; outside of it the line is a guess. */
	measuredV2GHz: [number, number];
	/** Whether power rises with V²·f at all; where not, heat, throttling or a wrong sensor speaks. */
	rises: boolean;
	line: LineFit;
}

const v2GHz = ({ clockMHz, volts }: Pick<PowerPoint, 'clockMHz' | 'volts'>): number =>
	(positive(volts, 'voltage') ** 2 * positive(clockMHz, 'clock')) / 1000;

/**
 * Package power as a + b·V²·f by ordinary least squares: b·V²·f is the switching power (Hennessy & Patterson, ch. 1,
 * from memory), for points of one load. The constant a is not the leakage alone: it holds whatever does not go with
 * V²·f, the rest of the package and what the sensor adds; and leakage rises with temperature and voltage, so that it
 * bends both numbers where the points were not equally hot.
 * RangeError with fewer than three points, values that are not above zero, or points that all have the same V²·f.
 */
export function fitPower(points: readonly PowerPoint[]): PowerFit {
	const x = points.map(v2GHz);
	const line = leastSquares(
		x,
		points.map(({ packageW }) => positive(packageW, 'package power'))
	);
	return {
		n: line.n,
		baseW: line.intercept,
		baseSeW: line.interceptSe,
		wPerV2GHz: line.slope,
		wPerV2GHzSe: line.slopeSe,
		residualSdW: line.residualSd,
		rSquared: line.rSquared,
		residualsW: line.residuals,
		measuredV2GHz: [Math.min(...x), Math.max(...x)],
		rises: line.slope > 0,
		line
	};
}

export interface PredictedPower extends Predicted {
	/** Whether V²·f lies outside what was measured. */
	outside: boolean;
}

/** The package power in W that a fit expects at a clock and voltage. RangeError for what is not above zero. */
export function powerAt(fit: PowerFit, setting: Pick<PowerPoint, 'clockMHz' | 'volts'>): PredictedPower {
	const x = v2GHz(setting);
	const [low, high] = fit.measuredV2GHz;
	return { ...predictAt(fit.line, x), outside: x < low || x > high };
}
