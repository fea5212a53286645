import type { ParamMatcher } from '@sveltejs/kit';

/** The number of a row in an address. */
export const match = ((param) => /^[1-9]\d{0,14}$/.test(param)) satisfies ParamMatcher;
