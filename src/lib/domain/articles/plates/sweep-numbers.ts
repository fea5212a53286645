import { printed } from '../../shared/quantity';
import { table } from '../html';
import { csv, type Field } from './csv';
import type { SweepSpec } from './sweep-spec';

const fitted = ({ fit }: SweepSpec, currentA: number): number | null =>
	fit.find((one) => one.currentA === currentA)?.clockMHz ?? null;

/** The points behind a plate of a sweep, pass by pass, each with the fit through all passes there. */
export const sweepTable = (spec: SweepSpec): string =>
	table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Threads', figures: true },
			{ head: 'Current, A', figures: true },
			{ head: 'Clock, MHz', figures: true },
			{ head: 'Fitted, MHz', figures: true }
		],
		spec.passes.map(({ number, points }) => ({
			head: `Pass ${number}`,
			rows: points.map(({ threads, currentA, clockMHz }) => [
				String(threads),
				printed(currentA),
				printed(clockMHz),
				printed(fitted(spec, currentA) ?? clockMHz, { decimals: 0 })
			])
		}))
	);

/** The same at full precision. */
export const sweepCsv = (spec: SweepSpec): string =>
	csv([
		['pass', 'threads', 'current_a', 'clock_mhz', 'fitted_clock_mhz', 'wanted_clock_mhz', 'crossing_a'],
		...spec.passes.flatMap(({ number, points }) =>
			points.map((point): Field[] => [
				number,
				point.threads,
				point.currentA,
				point.clockMHz,
				fitted(spec, point.currentA),
				spec.wantedMHz,
				spec.crossingA
			])
		)
	]);
