import { verdictWords } from '../../bench/figures';
import { halfWidthOf, printed, printedRange, printedRatio } from '../../shared/quantity';
import { table } from '../html';
import { csv, type Field } from './csv';
import { ladderCsv, ladderTable } from './ladder-numbers';
import { sweepCsv, sweepTable } from './sweep-numbers';
import { driftCsv, driftTable } from './drift-numbers';
import type { DotsSpec, PlateSpec, ScoresSpec } from './spec';
import { valueCsv, valueTable } from './value-numbers';

const scoresTable = (spec: ScoresSpec): string =>
	table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Profile' },
			{ head: 'n', figures: true },
			{ head: `Value, ${spec.unit}`, figures: true },
			{ head: '95 % interval', figures: true },
			{ head: 'Standard deviation', figures: true }
		],
		[
			{
				rows: spec.rows.map((row) => {
					const precision = { halfWidth: halfWidthOf(row.ci95) };
					return [
						row.name,
						String(row.n),
						printed(row.value, precision),
						row.ci95 ? printedRange(row.ci95, precision) : 'none',
						row.sd === null ? 'none' : printed(row.sd, { halfWidth: row.sd })
					];
				})
			}
		]
	);

const dotsTable = (spec: DotsSpec): string =>
	table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Profile' },
			{ head: 'n', figures: true },
			{ head: 'Ratio', figures: true },
			{ head: 'Gain', figures: true },
			{ head: '95 % interval', figures: true },
			{ head: 'Verdict' }
		],
		spec.rows.map((row) => ({
			head: row.name,
			rows: row.points.flatMap((point, index) =>
				point === null
					? []
					: [
							[
								spec.series[index]?.name ?? point.profile,
								String(point.n),
								printedRatio(point.ratio),
								point.printed,
								point.printedInterval ?? 'none',
								point.verdict === null ? 'none' : verdictWords[point.verdict]
							]
						]
			)
		}))
	);

/** The numbers of a plate as a table, at printed rounding. */
export function plateTable(spec: PlateSpec): string {
	switch (spec.kind) {
		case 'scores':
			return scoresTable(spec);
		case 'value':
			return valueTable(spec);
		case 'drift':
			return driftTable(spec);
		case 'ladder':
			return ladderTable(spec);
		case 'sweep':
			return sweepTable(spec);
		default:
			return dotsTable(spec);
	}
}

const scoresCsv = (spec: ScoresSpec): string =>
	csv([
		['profile', 'workload', 'unit', 'better', 'n', 'mean', 'median', 'sd', 'ci95_low', 'ci95_high'],
		...spec.rows.map((row): Field[] => [
			row.name,
			spec.workload,
			spec.unit,
			spec.better,
			row.n,
			row.mean,
			row.median,
			row.sd,
			row.ci95?.[0] ?? null,
			row.ci95?.[1] ?? null
		])
	]);

const dotsCsv = (spec: DotsSpec): string =>
	csv([
		[
			'workload',
			'profile',
			'over',
			'n',
			'n_over',
			'ratio',
			'gain_percent',
			'gain_ci95_low',
			'gain_ci95_high',
			'verdict'
		],
		...spec.rows.flatMap((row) =>
			row.points.flatMap((point, index): Field[][] =>
				point === null
					? []
					: [
							[
								row.workload,
								spec.series[index]?.name ?? point.profile,
								spec.baseline.name,
								point.n,
								point.nBaseline,
								point.ratio,
								point.gainPercent,
								point.ci95?.[0] ?? null,
								point.ci95?.[1] ?? null,
								point.verdict === null ? '' : verdictWords[point.verdict]
							]
						]
			)
		)
	]);

/** The numbers of a plate at full precision, as CSV by RFC 4180 with a header line. */
export function plateCsv(spec: PlateSpec): string {
	switch (spec.kind) {
		case 'scores':
			return scoresCsv(spec);
		case 'value':
			return valueCsv(spec);
		case 'drift':
			return driftCsv(spec);
		case 'ladder':
			return ladderCsv(spec);
		case 'sweep':
			return sweepCsv(spec);
		default:
			return dotsCsv(spec);
	}
}
