/** Why a service declines to do what it was asked. A route turns each into a status and words. */
export type Reason = 'not_found' | 'forbidden' | 'invalid' | 'conflict' | 'gone' | 'too_large' | 'too_many';

/** Messages by field name, each a sentence for the person who typed. */
export type FieldErrors = Record<string, string[]>;

export interface Refusal<R extends Reason = Reason> {
	ok: false;
	reason: R;
	/** What happened, what was kept, what to do next. */
	message: string;
	fields?: FieldErrors;
	/** What a caller may need to mend it, such as the newer revision on a conflict. */
	detail?: unknown;
}

export type Outcome<T, R extends Reason = Reason> = { ok: true; value: T } | Refusal<R>;

/** An expected success. @example return done(run.id) */
export const done = <T>(value: T): { ok: true; value: T } => ({ ok: true, value });

/** An expected refusal; bugs throw instead. @example return refuse('not_found', 'There is no such campaign.') */
export const refuse = <R extends Reason>(
	reason: R,
	message: string,
	more: { fields?: FieldErrors; detail?: unknown } = {}
): Refusal<R> => ({ ok: false, reason, message, ...more });
