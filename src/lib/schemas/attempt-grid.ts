import { z } from 'zod';
import { attemptColumns } from '../domain/bench/stability/attempt-block';
import { attemptInput, type AttemptInput } from './stability';

const cell = z.string().trim().max(300, 'Keep it to 300 characters.').default('');

const typedRow = z.object({
	clockMHz: cell,
	volts: cell,
	stress: cell,
	durationMin: cell,
	outcome: cell,
	failure: cell,
	errors: cell,
	peakTempC: cell,
	packageW: cell
});
export type GridRowTyped = z.output<typeof typedRow>;

/** Rows that the grid may hold. */
export const gridRows = 200;

/** A row of which only the choices, which repeat from row to row, are filled in is empty. */
const isBlank = (row: GridRowTyped): boolean =>
	attemptColumns.every((column) => column === 'stress' || column === 'outcome' || row[column] === '');

/** Several attempts as the grid sends them; empty rows are left out, and each row carries a key of its own. */
export const attemptGrid = z
	.object({
		formKey: z.string().regex(/^[\w-]{8,50}$/, 'The page is incomplete: load it again.'),
		attempts: z
			.array(typedRow)
			.max(gridRows, `The grid takes ${gridRows} attempts at once. Send the rest after.`)
	})
	.transform(({ formKey, attempts }, ctx) => {
		const taken: AttemptInput[] = [];
		attempts.forEach((row, index) => {
			if (isBlank(row)) return;
			const key = `${formKey}-${index}`;
			const parsed = attemptInput.safeParse({ ...row, errors: row.errors === '' ? 0 : row.errors, key });
			if (parsed.success) taken.push(parsed.data);
			else
				for (const issue of parsed.error.issues)
					ctx.addIssue({
						code: 'custom',
						message: issue.message,
						path: ['attempts', index, ...issue.path]
					});
		});
		if (taken.length === 0 && attempts.every(isBlank))
			ctx.addIssue({
				code: 'custom',
				message: 'Fill in at least one row.',
				path: ['attempts', 0, 'clockMHz']
			});
		return { attempts: taken };
	});
export type AttemptGridTyped = z.input<typeof attemptGrid>;

export const blankRow = (stress: string): GridRowTyped => ({
	clockMHz: '',
	volts: '',
	stress,
	durationMin: '',
	outcome: 'passed',
	failure: '',
	errors: '',
	peakTempC: '',
	packageW: ''
});

export const blankGrid = (formKey: string, stress: string): AttemptGridTyped => ({
	formKey,
	attempts: Array.from({ length: 3 }, () => blankRow(stress))
});
