/** Text in single quotes for a POSIX shell: a quote inside ends them, stands escaped, and begins them again. */
const quoted = (text: string): string => `'${text.replaceAll("'", `'\\''`)}'`;

/**
 * The command that sends JSON to the API with a personal token, ready to be pasted into a shell.
 * @example curlLine('https://lab.example', '/api/v1/ladders/first/attempts', { attempts: [] })
 */
export const curlLine = (origin: string, path: string, body: unknown): string =>
	[
		`curl -X POST ${quoted(origin + path)}`,
		'  -H "Authorization: Bearer $TOKEN"',
		"  -H 'Content-Type: application/json'",
		'  -H "Idempotency-Key: $(uuidgen)"',
		`  -d ${quoted(JSON.stringify(body))}`
	].join(' \\\n');

const isBlank = (value: unknown): boolean => value === '' || value === null || value === undefined;

/**
 * What a form holds, as a script would send it: fields left blank are left out, as the API takes its own value for them.
 * @example filledIn({ name: 'first', slug: '' }) // { name: 'first' }
 */
export function filledIn(value: unknown): unknown {
	if (Array.isArray(value)) return value.map(filledIn);
	if (value === null || typeof value !== 'object') return value;
	return Object.fromEntries(
		Object.entries(value).flatMap(([name, field]) => (isBlank(field) ? [] : [[name, filledIn(field)]]))
	);
}
