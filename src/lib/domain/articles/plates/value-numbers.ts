import { table } from '../html';
import { csv, type Field } from './csv';
import type { ValueSpec } from './spec';

/** What a plate of value draws, at printed rounding. */
export const valueTable = (spec: ValueSpec): string =>
	table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Profile' },
			{ head: 'n', figures: true },
			{ head: 'Value', figures: true },
			{ head: '95 % interval', figures: true }
		],
		[{ rows: spec.rows.map((row) => [row.name, String(row.n), row.printed, row.printedInterval ?? 'none']) }]
	);

/** The same at full precision. */
export const valueCsv = (spec: ValueSpec): string =>
	csv([
		['profile', 'workload', 'per', 'unit', 'better', 'n', 'value', 'ci95_low', 'ci95_high', 'how'],
		...spec.rows.map((row): Field[] => [
			row.name,
			spec.workload,
			spec.per,
			spec.unit,
			spec.better,
			row.n,
			row.value,
			row.ci95?.[0] ?? null,
			row.ci95?.[1] ?? null,
			spec.how
		])
	]);
