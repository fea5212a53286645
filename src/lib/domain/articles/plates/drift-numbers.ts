import { halfWidthOf, printed } from '../../shared/quantity';
import { table } from '../html';
import { csv, type Field } from './csv';
import type { DriftSpec } from './drift-spec';

/** The runs behind a plate of drift, at printed rounding. */
export function driftTable(spec: DriftSpec): string {
	const precision = { halfWidth: halfWidthOf([spec.limits.lower, spec.limits.upper]) };
	const orNone = (value: number | null | undefined) => (value == null ? 'none' : printed(value, precision));
	return table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Run', figures: true },
			{ head: 'Day' },
			{ head: 'Campaign' },
			{ head: `Mean, ${spec.unit}`, figures: true },
			{ head: 'n', figures: true },
			{ head: 'Weighted average', figures: true },
			{ head: 'Moving range', figures: true },
			{ head: 'Signals and beginnings' }
		],
		[
			{
				rows: spec.points.map((point) => [
					String(point.number),
					point.at.slice(0, 10),
					point.campaignName,
					printed(point.mean, precision),
					String(point.n),
					orNone(point.average?.ewma),
					orNone(point.movingRange),
					point.inWindow
						? 'one of those the limits are from'
						: [...point.signals, ...(point.begun ? [point.begun] : [])].join('; ')
				])
			}
		]
	);
}

/** The same at full precision. */
export const driftCsv = (spec: DriftSpec): string =>
	csv([
		[
			'run',
			'at',
			'campaign',
			'revision',
			'n',
			'mean',
			'unit',
			'in_window',
			'moving_range',
			'ewma',
			'ewma_low',
			'ewma_high',
			'signals',
			'ewma_begun_anew',
			'centre',
			'lower',
			'upper'
		],
		...spec.points.map((point): Field[] => [
			point.number,
			point.at,
			point.campaign,
			point.revision,
			point.n,
			point.mean,
			spec.unit,
			point.inWindow ? 'yes' : 'no',
			point.movingRange,
			point.average?.ewma ?? null,
			point.average?.lower ?? null,
			point.average?.upper ?? null,
			point.signals.join('; '),
			point.begun ?? '',
			spec.limits.centre,
			spec.limits.lower,
			spec.limits.upper
		])
	]);
