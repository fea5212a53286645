import { nearest } from '../shared/nearest';
import { missing } from './directives/shape';

/**
 * A name that nobody knows: the message, with the names nearest to it; where none is near, the message tells
 * the first few there are, so that a writer sees what can be named.
 */
export function unknownName(
	message: string,
	typed: string,
	known: readonly string[]
): ReturnType<typeof missing> {
	const names = [...new Set(known)];
	const near = nearest(typed, names);
	if (near.length > 0 || names.length === 0) return missing(message, near);
	const first = names.slice(0, 5).join(', ');
	const more = names.length > 5 ? ` and ${names.length - 5} more` : '';
	return missing(`${message} There ${names.length === 1 ? 'is' : 'are'} ${first}${more}.`);
}
