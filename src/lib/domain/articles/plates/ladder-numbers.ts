import { printed } from '../../shared/quantity';
import { table } from '../html';
import { csv, type Field } from './csv';
import { ladderMarkWords, type LadderSpec } from './ladder-spec';

const orNone = (value: number | null): string => (value === null ? 'none' : printed(value));

/** The attempts behind a plate of a ladder, stress by stress in the order they were made. */
export const ladderTable = (spec: LadderSpec): string =>
	table(
		`Numbers of ${spec.title}`,
		[
			{ head: 'Clock, MHz', figures: true },
			{ head: 'Voltage, V', figures: true },
			{ head: 'Minutes', figures: true },
			{ head: 'Outcome' },
			{ head: 'Hottest, °C', figures: true },
			{ head: 'Power, W', figures: true }
		],
		spec.series.map(({ name, demand, tries }) => ({
			head: `${name} (${demand})`,
			rows: tries.map((one) => [
				printed(one.clockMHz),
				printed(one.volts),
				printed(one.durationMin),
				`${ladderMarkWords[one.result]}${one.failure ? `: ${one.failure}` : ''}`,
				orNone(one.peakTempC),
				orNone(one.packageW)
			])
		}))
	);

/** The same at full precision, with the voltage each clock needs. */
export const ladderCsv = (spec: LadderSpec): string =>
	csv([
		[
			'stress',
			'clock_mhz',
			'volts',
			'minutes',
			'result',
			'failure',
			'peak_temp_c',
			'package_w',
			'lowest_volts_passed'
		],
		...spec.series.flatMap(({ stress, tries, need }) =>
			tries.map((one): Field[] => [
				stress,
				one.clockMHz,
				one.volts,
				one.durationMin,
				one.result,
				one.failure,
				one.peakTempC,
				one.packageW,
				need.find((lowest) => lowest.clockMHz === one.clockMHz)?.volts ?? null
			])
		)
	]);
