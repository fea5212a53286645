import type { FieldErrors } from '$lib/domain/shared/outcome';

/** A refused small form, with what was typed into it. */
export interface RefusedAct {
	typed: Record<string, string>;
	message: string;
	fields: FieldErrors;
}
