import { fail } from '@sveltejs/kit';
import { setError, superValidate, type SuperValidated } from 'sveltekit-superforms';
import { zod4 } from 'sveltekit-superforms/adapters';
import type { z } from 'zod';
import type { Refusal } from '../../domain/shared/outcome';
import { nestFields } from './nest-fields';
import { statusOf } from './problem';

type Shape = Record<string, unknown>;
type FormSchema = z.ZodObject | z.ZodPipe<z.ZodObject, z.ZodType<Shape, Shape>>;

/** A form as its page shows it: what was typed, as it was typed, with the errors beside it. */
export type Form<S extends FormSchema> =
	z.input<S> extends infer Typed extends Shape ? SuperValidated<Typed, string, Typed> : never;

const adapterOf = <S extends FormSchema>(schema: S, blank: z.input<S>) =>
	zod4(schema, { config: { io: 'input' }, defaults: blank as never });

/**
 * A form to fill in or to change, without errors.
 * @example form: await blankForm(partInput, blankPart(today))
 */
export async function blankForm<S extends FormSchema>(
	schema: S,
	data: z.input<S>,
	id?: string
): Promise<Form<S>> {
	const form = await superValidate(data as never, adapterOf(schema, data), { errors: false, id });
	// The page shows what is to be filled in, not what the schema would make of it.
	return { ...form, data } as unknown as Form<S>;
}

/**
 * Reads a posted form, sent by script or, without it, with names such as 'settings.0.value' and 'samples[]'.
 * `value` is what the schema makes of it, absent when something is refused; `form` keeps what was typed either way.
 */
export async function readForm<S extends FormSchema>(
	request: Request,
	schema: S,
	blank: z.input<S>,
	id?: string
): Promise<{ form: Form<S>; value?: z.output<S> }> {
	const posted = await request.formData();
	const adapter = adapterOf(schema, blank);
	let value: z.output<S> | undefined;
	const keeping = {
		...adapter,
		// The form must keep the text as typed, so the schema's output is set aside.
		validate: async (data: unknown) => {
			const result = await adapter.validate(data);
			if (!result.success) return result;
			value = result.data as z.output<S>;
			return { success: true as const, data: data as never };
		}
	};
	const data = posted.has('__superform_json') ? posted : nestFields(posted);
	const typed = data instanceof FormData ? {} : { ...data };
	const form = await superValidate(data as never, keeping as typeof adapter, { id });
	// The library puts a field's default where text stands for a number, such as the version of the row.
	for (const [key, text] of Object.entries(typed)) {
		if (key in blank && typeof text === 'string') form.data = { ...form.data, [key]: text };
	}
	form.posted = true;
	return { form: form as unknown as Form<S>, value };
}

/** A form that its schema refused, back to its page. */
export const refuseForm = <F extends { valid: boolean }>(form: F) => fail(422, { form });

/**
 * A form that a service refused: field errors beside their fields, the words above them, what was typed kept.
 * @example if (!outcome.ok) return refusedForm(form, outcome);
 */
export function refusedForm<F extends SuperValidated<Shape, string, Shape>>(form: F, refusal: Refusal) {
	for (const [path, messages] of Object.entries(refusal.fields ?? {}))
		setError(form, path as never, messages);
	form.valid = false;
	form.message = refusal.message;
	return fail(statusOf(refusal.reason), { form });
}
