import { readFileSync } from 'node:fs';
import { join } from 'node:path';

// What R 4.2.2 gives for the really measured runs in tests/fixtures/readings.csv; the command is tests/fixtures/reference.R.
const fixtures = join(import.meta.dirname, '..', 'fixtures');
const text = (name: string) => readFileSync(join(fixtures, name), 'utf8');

export interface Measured {
	profile: string;
	workload: string;
	unit: string;
	better: 'higher' | 'lower';
	class: string;
	value: number;
	startedAt: string;
	line: string;
}

/** The demo has workloads of its own: those of the fixtures get a prefix beside them. */
const prefix = 'vm-';

export const header = 'profile,workload,unit,better,class,repeat,value,started_at';
export const measured: Measured[] = text('readings.csv')
	.trim()
	.split(/\r?\n/)
	.slice(1)
	.map((line) => {
		const [profile = '', workload = '', unit = '', better, kind = '', , value, startedAt = ''] =
			line.split(',');
		return {
			profile,
			workload: prefix + workload,
			unit,
			better: better === 'lower' ? 'lower' : 'higher',
			class: kind,
			value: Number(value),
			startedAt,
			line: line.replace(`,${workload},`, `,${prefix}${workload},`)
		};
	});

const rows = text('reference.txt')
	.trim()
	.split(/\r?\n/)
	.map((line) => line.split(','));
const section = (first: string) => {
	const from = rows.findIndex((row) => row.join(',').startsWith(first));
	const to = rows.findIndex((row, index) => index > from && (row[0] === 'profile' || row.length === 1));
	return rows.slice(from + 1, to < 0 ? undefined : to);
};

/** R's summary of a cell. */
export function cellByR(profile: string, workload: string) {
	const row = section('profile,workload,n,').find((r) => r[0] === profile && prefix + r[1] === workload);
	if (!row) throw new Error(`R has no ${profile} ${workload}.`);
	const [, , n, mean, median, sd, cv, low, high] = row.map(Number);
	return { n, mean, median, sd, cv, low, high };
}

/** R's ratio of means, turned so that above 1 is better. */
export function ratioByR(profile: string, workload: string): number {
	const row = section('profile,workload,ratio').find((r) => r[0] === profile && prefix + r[1] === workload);
	if (!row) throw new Error(`R has no ratio of ${profile} ${workload}.`);
	return Number(row[2]);
}

/** R's geometric mean of a profile's ratios. */
export function overallByR(profile: string): number {
	const row = section('profile,geometric').find((r) => r[0] === profile);
	if (!row) throw new Error(`R has no geometric mean of ${profile}.`);
	return Number(row[1]);
}

/** A printed figure as a number, and half a unit of its last printed place. */
export function readPrinted(printed: string): { value: number; halfStep: number } {
	const figure = /[+−-]?\d[\d\u2009\u202f\u00a0 ]*(?:\.\d+)?/.exec(printed)?.[0];
	if (!figure) throw new Error(`No figure in “${printed}”.`);
	const plain = figure.replace(/[\s\u2009\u202f\u00a0]/g, '').replace('−', '-');
	const decimals = plain.split('.')[1]?.length ?? 0;
	// Whole numbers may be rounded to tens or hundreds: the zeros at their end were not measured.
	const zeros = decimals === 0 ? (/0*$/.exec(plain)?.[0].length ?? 0) : 0;
	return { value: Number(plain), halfStep: 0.5 * 10 ** (decimals > 0 ? -decimals : zeros) };
}
