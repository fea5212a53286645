import { fail } from '@sveltejs/kit';
import type { z } from 'zod';
import type { FieldErrors } from '../../domain/shared/outcome';
import { errorsOf } from './api';

/** A refused small form, with what was typed into it. */
export interface RefusedForm {
	typed: Record<string, string>;
	message: string;
	fields: FieldErrors;
}

/**
 * Reads a small form of texts, such as a reason in a dialog, through its schema. `value` is absent when it is refused;
 * `refused` then goes back to the page.
 * @param lists names of boxes of which several may be ticked: they come as lines of one text
 */
export async function readPlainForm<S extends z.ZodType>(request: Request, schema: S, lists: string[] = []) {
	const posted = await request.formData();
	const typed = Object.fromEntries(
		[...posted].flatMap(([name, value]) => (typeof value === 'string' ? [[name, value]] : []))
	) as Record<string, string>;
	for (const name of lists) typed[name] = posted.getAll(name).join('\n');
	const checked = schema.safeParse(typed);
	if (checked.success) return { typed, value: checked.data as z.output<S> };
	const fields = errorsOf(checked.error);
	const message = Object.values(fields).flat()[0] ?? 'That was not accepted.';
	const refused: RefusedForm = { typed, message: `${message} Nothing was changed.`, fields };
	return { typed, refused: fail(422, { refused }) };
}
