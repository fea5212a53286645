/** The errors of a list as a whole, out of the form library's errors, which may be those of its rows as well. */
export function listErrors(errors: unknown): string[] | undefined {
	if (Array.isArray(errors)) return errors.map(String);
	if (typeof errors !== 'object' || errors === null) return undefined;
	return '_errors' in errors && Array.isArray(errors._errors) ? errors._errors.map(String) : undefined;
}
