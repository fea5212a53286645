import { isSlug } from '$lib/domain/shared/slug';
import type { ParamMatcher } from '@sveltejs/kit';

/** The name of a row in an address. */
export const match = ((param) => isSlug(param)) satisfies ParamMatcher;
