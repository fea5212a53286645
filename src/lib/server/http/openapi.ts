import { z } from 'zod';
import { policy, type Act } from '../../domain/people/policy';
import { scopes } from '../../domain/people/roles';
import { jsonLimitBytes } from './body';

/** One operation of the API, told by the schemas that check it. */
export interface Described {
	method: 'get' | 'post' | 'put' | 'patch' | 'delete';
	/** As in the address, parameters in braces: `/api/v1/campaigns/{campaign}/runs`. */
	path: string;
	act: Act | 'public';
	summary: string;
	/** What the API reads from JSON. */
	body?: z.ZodType;
	/** Types of a file that is the body itself. */
	upload?: string[];
	/** An object schema of the query string. */
	query?: z.ZodObject;
	response: z.ZodType;
	/** Of a success; 200 when left out. */
	status?: number;
}

/** Declares an operation; a plain value, so that the description is data. */
export const describe = (operation: Described): Described => operation;

type Json = Record<string, unknown>;

/** References of a schema point into itself; inside this document the parts they name stand under components. */
function pointed(value: unknown): unknown {
	if (Array.isArray(value)) return value.map(pointed);
	if (typeof value !== 'object' || value === null) return value;
	return Object.fromEntries(
		Object.entries(value).map(([key, inner]) =>
			key === '$ref' && typeof inner === 'string'
				? [key, inner.replace('#/$defs/', '#/components/schemas/')]
				: [key, pointed(inner)]
		)
	);
}

function parted(schema: z.ZodType, io: 'input' | 'output'): { body: Json; parts: Json } {
	const made = z.toJSONSchema(schema, { io, target: 'draft-2020-12', unrepresentable: 'any' });
	const { $schema: _dialect, $defs = {}, ...body } = made;
	return { body: pointed(body) as Json, parts: pointed($defs) as Json };
}

const jsonSchema = (schema: z.ZodType, io: 'input' | 'output'): Json => parted(schema, io).body;

/** The named parts that all schemas share. */
const partsOf = (operations: Described[]): Json =>
	Object.assign(
		{},
		...operations.flatMap(({ body, response }) => [
			parted(response, 'output').parts,
			...(body ? [parted(body, 'input').parts] : [])
		])
	) as Json;

const content = (schema: Json, type = 'application/json') => ({ [type]: { schema } });
const uploadContent = (types: string[]) =>
	Object.assign({}, ...types.map((type) => content({}, type))) as Json;
const problemRef = (description: string) => ({
	description,
	content: content({ $ref: '#/components/schemas/Problem' }, 'application/problem+json')
});

const pathParameters = (path: string) =>
	[...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
		name,
		in: 'path',
		required: true,
		description: 'The slug, or the number, of the row.',
		schema: { type: 'string' }
	}));

function queryParameters(query: z.ZodObject | undefined) {
	if (!query) return [];
	const { properties = {}, required = [] } = jsonSchema(query, 'input') as {
		properties?: Record<string, Json>;
		required?: string[];
	};
	return Object.entries(properties).map(([name, schema]) => ({
		name,
		in: 'query',
		required: required.includes(name),
		schema
	}));
}

const idempotencyHeader = {
	name: 'Idempotency-Key',
	in: 'header',
	required: false,
	description: 'The same key with the same body has its effect once; kept for 24 hours.',
	schema: { type: 'string', maxLength: 190 }
};

const locationHeader = {
	Location: { description: 'Where what was made is read.', schema: { type: 'string' } }
};

function responsesOf(
	{ method, act, body, query, path, response, status = 200 }: Described,
	located: boolean
) {
	const writes = body !== undefined || method !== 'get';
	return {
		[status]: {
			description: 'Done.',
			...(located ? { headers: locationHeader } : {}),
			content: content(jsonSchema(response, 'output'))
		},
		...(act === 'public'
			? {}
			: { 401: problemRef('No valid token.'), 403: problemRef('Roles or scopes do not include it.') }),
		...(path.includes('{') ? { 404: problemRef('There is no such row.') } : {}),
		...(writes
			? { 400: problemRef('Not JSON.'), 409: problemRef('Conflict.'), 413: problemRef('Too large.') }
			: {}),
		...(writes || query ? { 422: problemRef('Not accepted; `errors` says why, by field.') } : {})
	};
}

const scopeOf = (act: Act) => ('scope' in policy[act] ? policy[act].scope : undefined);

function operationOf(described: Described, located: boolean) {
	const { method, path, act, summary, body, upload, query } = described;
	const scope = act === 'public' ? undefined : scopeOf(act);
	return {
		operationId: `${method} ${path.replace('/api/v1', '')}`.replace(/\W+(\w?)/g, (_, next: string) =>
			next.toUpperCase()
		),
		summary,
		...(scope ? { description: `Needs the scope \`${scope}\`.` } : {}),
		security: act === 'public' ? [] : [{ token: [] }],
		parameters: [
			...pathParameters(path),
			...queryParameters(query),
			...((method === 'post' && !upload) || method === 'put' ? [idempotencyHeader] : [])
		],
		...(body ? { requestBody: { required: true, content: content(jsonSchema(body, 'input')) } } : {}),
		...(upload ? { requestBody: { required: true, content: uploadContent(upload) } } : {}),
		responses: responsesOf(described, located)
	};
}

const problemSchema = {
	type: 'object',
	description: 'RFC 9457.',
	required: ['type', 'title', 'status', 'detail'],
	properties: {
		type: { type: 'string' },
		title: { type: 'string' },
		status: { type: 'integer' },
		detail: { type: 'string' },
		errors: { type: 'object', additionalProperties: { type: 'array', items: { type: 'string' } } }
	}
};

/** The OpenAPI 3.1 document of what is described, made from the schemas that check it. */
export function openApi(operations: Described[], origin: string) {
	const paths: Record<string, Json> = {};
	const read = new Set(operations.filter(({ method }) => method === 'get').map(({ path }) => path));
	for (const operation of operations) {
		const { method, path } = operation;
		// A list's POST makes what is read one step below it.
		const located =
			method === 'post' && [...read].some((one) => one.replace(/\/\{\w+\}$/, '') === path && one !== path);
		(paths[path] ??= {})[method] = operationOf(operation, located);
	}
	return {
		openapi: '3.1.0',
		info: {
			title: 'Calipress',
			version: '1',
			description: `The bench, for scripts. Errors are problem documents (RFC 9457). A JSON body has at most ${jsonLimitBytes / 1e6} MB. Scopes: ${scopes.join(', ')}.`
		},
		servers: [{ url: origin }],
		paths,
		components: {
			schemas: { ...partsOf(operations), Problem: problemSchema },
			securitySchemes: {
				token: { type: 'http', scheme: 'bearer', description: 'A personal token, made on your own page.' }
			}
		}
	};
}
