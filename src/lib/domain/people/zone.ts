/** Whether a name is a time zone of the IANA database, with a place or UTC; offsets such as +02:00 are none. */
export function isZone(name: string): boolean {
	if (!/^[A-Za-z]/.test(name)) return false;
	try {
		return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone !== '';
	} catch {
		return false;
	}
}
