import type { RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import type { FieldErrors, Outcome } from '../../domain/shared/outcome';
import { readBody } from './body';
import { problem, problemFrom } from './problem';

/** Either the value, or the response that says why there is none. */
export type Read<T> = { ok: true; value: T } | { ok: false; response: Response };

/** Messages by field path, such as `readings.3`; what concerns the whole stands under `body`. */
export function errorsOf(error: z.ZodError): FieldErrors {
	const errors: FieldErrors = {};
	for (const issue of error.issues) {
		const path = issue.path.map(String).join('.') || 'body';
		(errors[path] ??= []).push(issue.message);
	}
	return errors;
}

const no = (response: Response) => ({ ok: false as const, response });

/** The parser's own words say where it stopped, with a snippet of the body at most. */
function parse(text: string): Read<unknown> {
	try {
		return { ok: true, value: JSON.parse(text) as unknown };
	} catch (error) {
		const where = error instanceof Error ? ` ${error.message}.` : '';
		const number = /\b(NaN|Infinity)\b/.exec(text)?.[1];
		const hint = number ? ` JSON knows no ${number}.` : '';
		return no(
			problem(400, 'Not JSON', `The body cannot be read as JSON.${where}${hint} Nothing was stored.`)
		);
	}
}

/**
 * Reads a JSON body through its schema.
 * @example const body = await readJson(event, runInput); if (!body.ok) return body.response;
 */
export async function readJson<S extends z.ZodType>(
	event: Pick<RequestEvent, 'request'>,
	schema: S
): Promise<Read<z.output<S>>> {
	const type = event.request.headers.get('content-type') ?? '';
	if (!/^application\/([\w.-]+\+)?json\s*(;|$)/i.test(type))
		return no(problem(415, 'Not JSON', 'Send the body as JSON, with Content-Type: application/json.'));
	const text = await readBody(event);
	if (!text.ok) return no(problemFrom(text));
	const body = parse(text.value);
	if (!body.ok) return body;
	const checked = schema.safeParse(body.value);
	if (checked.success) return { ok: true, value: checked.data };
	const errors = errorsOf(checked.error);
	return no(problem(422, 'Not accepted', `${sayCount(errors)} Nothing was stored.`, { errors }));
}

/** Reads the query string through its schema; a name given twice counts once, the last. */
export function readQuery<S extends z.ZodType>(url: URL, schema: S): Read<z.output<S>> {
	const checked = schema.safeParse(Object.fromEntries(url.searchParams));
	if (checked.success) return { ok: true, value: checked.data };
	return no(
		problem(422, 'Not accepted', 'The address has a parameter that cannot be used.', {
			errors: errorsOf(checked.error)
		})
	);
}

const sayCount = (errors: FieldErrors) => {
	const n = Object.keys(errors).length;
	return n === 1 ? 'One field was not accepted.' : `${n} fields were not accepted.`;
};

/** A value as a JSON response; the API's answers are never kept by a cache. */
export function json(value: unknown, init: ResponseInit = {}): Response {
	const headers = new Headers(init.headers);
	headers.set('content-type', 'application/json');
	if (!headers.has('cache-control')) headers.set('cache-control', 'no-store');
	return new Response(JSON.stringify(value), { ...init, headers });
}

/** An outcome as a response: its value as JSON, or its refusal as a problem. @example return answer(outcome, 201) */
export const answer = (outcome: Outcome<unknown>, status = 200): Response =>
	outcome.ok ? json(outcome.value, { status }) : problemFrom(outcome);

/**
 * What was made as a response: 201, with the address it is read at in `Location`; or its refusal as a problem.
 * @example return created(outcome, (part) => `/api/v1/parts/${part.slug}`)
 */
export const created = <T>(outcome: Outcome<T>, addressOf: (value: T) => string): Response =>
	outcome.ok
		? json(outcome.value, { status: 201, headers: { location: addressOf(outcome.value) } })
		: problemFrom(outcome);

export { idempotent } from './idempotency';
