import { nearest } from '../shared/nearest';

/** The names nearest to what was typed; where none is near, the first few there are, so that a writer sees what can be named. */
export function namesNear(typed: string, known: readonly string[]): string[] {
	const names = [...new Set(known)];
	const near = nearest(typed, names);
	return near.length > 0 ? near : names.slice(0, 5);
}
