import { suggestMeaning } from '$lib/domain/bench/tuning/suggest-meaning';

/**
 * Where a tester says what a setting of a firmware family sets, with what is known filled in.
 * @param suggestion what its name suggests, where that was looked up already
 */
export function teachAddress(family: string, setting: string, suggestion = suggestMeaning(setting)): string {
	const known = { family, setting, ...(suggestion && { quantity: suggestion.quantity }) };
	return `/bench/meanings/new?${new URLSearchParams(known)}`;
}
