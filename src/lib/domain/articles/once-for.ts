const kept = new WeakMap<object, Map<string, unknown>>();
/** More than any article names; what is over it begins anew, so that typing a name letter by letter keeps nothing. */
const mostKept = 2000;

/**
 * What is made from data and a name, made once as long as the data is the same object: an article's data is read
 * anew, never changed. The result is shared, so nobody may change it either.
 */
export function onceFor<T>(data: object, name: string, make: () => T): T {
	let made = kept.get(data);
	if (!made || made.size >= mostKept) kept.set(data, (made = new Map<string, unknown>()));
	const known = made.get(name);
	if (known !== undefined) return known as T;
	const fresh = make();
	made.set(name, fresh);
	return fresh;
}
