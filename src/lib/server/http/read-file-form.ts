import { fail } from '@sveltejs/kit';
import type { z } from 'zod';
import type { FieldErrors, Refusal } from '../../domain/shared/outcome';
import { errorsOf } from './api';
import { statusOf } from './problem';

/** What a page shows again of a form with a file in it that was refused; the file itself has to be chosen anew. */
export interface RefusedFile {
	message: string;
	fields: FieldErrors;
	typed: Record<string, string>;
	lists: Record<string, string[]>;
}

/** Reads a posted form with a file; names that end in `[]` are lists. */
export async function readFileForm<S extends z.ZodType>(request: Request, schema: S) {
	const posted = await request.formData();
	const given: Record<string, unknown> = {};
	const typed: RefusedFile['typed'] = {};
	const lists: RefusedFile['lists'] = {};
	for (const name of new Set(posted.keys())) {
		const values = posted.getAll(name).filter((value) => typeof value === 'string');
		if (name.endsWith('[]')) given[name.slice(0, -2)] = lists[name.slice(0, -2)] = values;
		else {
			given[name] = posted.get(name) ?? undefined;
			if (values[0] !== undefined) typed[name] = values[0];
		}
	}
	const refused = (status: number, message: string, fields: FieldErrors) =>
		fail(status, { refused: { message, fields, typed, lists } satisfies RefusedFile });
	const read = schema.safeParse(given);
	if (read.success)
		return {
			value: read.data as z.output<S>,
			refuse: ({ reason, message, fields = {} }: Refusal) => refused(statusOf(reason), message, fields)
		};
	const fields = errorsOf(read.error);
	return {
		refused: refused(
			422,
			`${Object.values(fields).flat()[0] ?? 'That was not accepted.'} Nothing was changed.`,
			fields
		)
	};
}

/** A chosen file as a service takes it. */
export const bytesOf = async (file: File) => ({
	fileName: file.name,
	bytes: new Uint8Array(await file.arrayBuffer())
});
