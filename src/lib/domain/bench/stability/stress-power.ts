import { type Attempt, settingWords } from './attempt';
import { fitPower, type PowerFit, powerAt } from './power-fit';

export interface PowerResidual {
	setting: string;
	packageW: number;
	fittedW: number;
	/** Measured less fitted. */
	residualW: number;
}

export type StressPower =
	{ fit: PowerFit; residuals: PowerResidual[]; why: null } | { fit: null; residuals: []; why: string };

const isPoint = (one: Attempt): one is Attempt & { packageW: number } =>
	one.packageW !== null && one.packageW > 0 && one.outcome !== 'stopped';

/**
 * Package power over V²·f for the attempts of one stress, with what each point leaves; where no line can be drawn,
 * why not. Attempts that were stopped by hand are left out: their power may not have settled.
 */
export function stressPower(attempts: readonly Attempt[], stress: string): StressPower {
	const points = attempts.filter((one) => one.stress === stress).filter(isPoint);
	const different = new Set(points.map(({ clockMHz, volts }) => volts ** 2 * clockMHz)).size;
	if (points.length < 3 || different < 2) {
		const why = `Power over V²·f needs three attempts with a power at two settings or more; there ${points.length === 1 ? 'is 1' : `are ${points.length}`}.`;
		return { fit: null, residuals: [], why };
	}
	const fit = fitPower(points);
	return {
		fit,
		residuals: points.map((point) => {
			const { value } = powerAt(fit, point);
			return {
				setting: settingWords(point),
				packageW: point.packageW,
				fittedW: value,
				residualW: point.packageW - value
			};
		}),
		why: null
	};
}
