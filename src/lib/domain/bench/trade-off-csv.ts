import Papa from 'papaparse';
import { verdictWords } from './figures';
import type { ProfileTradeOff } from './trade-off';
import type { ValueFigures } from './value-figures';

/** Every figure of a trade-off as CSV, one line each; nothing is rounded. */
export function tradeOffCsv(
	baseline: string,
	sides: readonly ProfileTradeOff[],
	values: readonly ValueFigures[]
): string {
	const blank = {
		profile: '',
		measure: '',
		unit: '',
		value: '',
		low_95: '',
		high_95: '',
		verdict: '',
		how: ''
	};
	const rows = [
		...sides.flatMap(({ profile, classes, costs }) => [
			...classes.flatMap(({ class: kind, overall }) =>
				overall
					? [
							{
								...blank,
								profile,
								measure: `${kind}: geometric mean over ${baseline}`,
								unit: 'ratio',
								value: overall.ratio,
								low_95: overall.ci95?.[0] ?? '',
								high_95: overall.ci95?.[1] ?? '',
								how: overall.workloads.join(', ')
							}
						]
					: []
			),
			...costs.flatMap(({ workload, unit, kind, summary, more, moreCi95, verdict }) => [
				...(summary
					? [
							{
								...blank,
								profile,
								measure: `${kind}: ${workload}`,
								unit,
								value: summary.mean,
								low_95: summary.ci95?.[0] ?? '',
								high_95: summary.ci95?.[1] ?? ''
							}
						]
					: []),
				...(more === null
					? []
					: [
							{
								...blank,
								profile,
								measure: `${kind}: ${workload} less ${baseline}`,
								unit,
								value: more,
								low_95: moreCi95?.[0] ?? '',
								high_95: moreCi95?.[1] ?? '',
								verdict: verdict ? verdictWords[verdict] : ''
							}
						])
			])
		]),
		...values.flatMap(({ workload, kind, unit, how, rows: made }) =>
			made.map(({ profile, figure }) => ({
				...blank,
				profile,
				measure: `${kind === 'energy' ? 'energy' : `per ${kind}`}: ${workload}`,
				unit,
				value: figure.value,
				low_95: figure.ci95?.[0] ?? '',
				high_95: figure.ci95?.[1] ?? '',
				how
			}))
		)
	];
	return `${Papa.unparse(rows, { columns: Object.keys(blank), newline: '\r\n', escapeFormulae: /^[=+@\t\r]/ })}\r\n`;
}
