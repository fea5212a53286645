import { describe, expect, it } from 'vitest';
import { openApi } from '../../../src/lib/server/http/openapi';
import { described } from '../../../src/lib/server/http/openapi-paths';
import type { Need } from '../../../src/lib/server/http/guarded';
import { origin } from '../../support/app';

type Module = Record<string, { need?: Need } | undefined>;
const modules = import.meta.glob<Module>('../../../src/routes/api/v1/**/+server.ts');
const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'];

const pathOf = (file: string) =>
	file
		.replace('../../../src/routes', '')
		.replace(/\/\+server\.ts$/, '')
		.replace(/\[(\w+)(=\w+)?\]/g, '{$1}');

async function implemented(): Promise<string[]> {
	const each = await Promise.all(
		Object.entries(modules).map(async ([file, load]) => {
			const module = await load();
			return methods
				.filter((name) => module[name])
				.map((name) => `${name} ${pathOf(file)} needs ${module[name]?.need}`);
		})
	);
	return each.flat().sort();
}

type Json = Record<string, unknown>;
const document = JSON.parse(JSON.stringify(openApi(described, origin))) as {
	openapi: string;
	info: Json;
	servers: { url: string }[];
	paths: Record<string, Record<string, Operation>>;
	components: { schemas: Json; securitySchemes: Json };
};
interface Operation {
	operationId: string;
	summary: string;
	security: Record<string, string[]>[];
	parameters: { name: string; in: string; required: boolean; schema: Json }[];
	requestBody?: { content: Record<string, { schema: Json }> };
	responses: Record<string, { description: string; content?: Record<string, { schema: Json }> }>;
}
const operations = Object.entries(document.paths).flatMap(([path, item]) =>
	Object.entries(item).map(([method, operation]) => ({ path, method, operation }))
);

/** Every `$ref` below a value. */
const refsIn = (value: unknown): string[] =>
	typeof value !== 'object' || value === null
		? []
		: Object.entries(value).flatMap(([key, inner]) =>
				key === '$ref' && typeof inner === 'string' ? [inner] : refsIn(inner)
			);

const targetOf = (root: unknown, ref: string) =>
	ref
		.replace(/^#\/?/, '')
		.split('/')
		.filter(Boolean)
		.reduce<unknown>(
			(at, key) => (at as Json | undefined)?.[key.replaceAll('~1', '/').replaceAll('~0', '~')],
			root
		);

describe('the description of the API', () => {
	it('tells every route and method there is, with the act its handler needs, and no other', async () => {
		const told = described
			.map(({ method, path, act }) => `${method.toUpperCase()} ${path} needs ${act}`)
			.sort();
		expect(told).toEqual(await implemented());
	});

	// What follows is what the OpenAPI Specification 3.1.0 asks of a document (sections 4.8.1 to 4.8.21, wording from memory).
	it('is an OpenAPI 3.1 document with title, version, servers and paths', () => {
		expect(document.openapi).toMatch(/^3\.1\.\d+$/);
		expect(document.info).toMatchObject({ title: expect.any(String), version: expect.any(String) });
		expect(document.servers).toEqual([{ url: origin }]);
		expect(Object.keys(document.paths).every((path) => path.startsWith('/'))).toBe(true);
	});

	it('gives each operation a name of its own and at least one response with a description', () => {
		const names = operations.map(({ operation }) => operation.operationId);
		expect(new Set(names).size).toBe(names.length);
		for (const { path, operation } of operations) {
			const statuses = Object.keys(operation.responses);
			expect(
				statuses.some((status) => /^2\d\d$/.test(status)),
				path
			).toBe(true);
			expect(
				statuses.every((status) => /^[1-5]\d\d$/.test(status)),
				path
			).toBe(true);
			for (const response of Object.values(operation.responses)) expect(response.description).not.toBe('');
		}
	});

	it('declares each parameter of a path, required, and no parameter twice', () => {
		for (const { path, operation } of operations) {
			const inPath = operation.parameters.filter((parameter) => parameter.in === 'path');
			expect(inPath.map(({ name }) => name)).toEqual(
				[...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name)
			);
			expect(inPath.every(({ required }) => required)).toBe(true);
			const all = operation.parameters.map((parameter) => `${parameter.in} ${parameter.name}`);
			expect(new Set(all).size, path).toBe(all.length);
			expect(operation.parameters.every(({ schema }) => typeof schema === 'object')).toBe(true);
		}
	});

	it('asks for the token where one is needed, by a scheme it declares', () => {
		for (const { operation } of operations) {
			for (const name of operation.security.flatMap(Object.keys))
				expect(document.components.securitySchemes).toHaveProperty(name);
		}
		const open = operations
			.filter(({ operation }) => operation.security.length === 0)
			.map(({ path }) => path);
		expect(open.sort()).toEqual(['/api/v1/me', '/api/v1/openapi.json']);
	});

	it('refers to nothing that is missing', () => {
		for (const ref of refsIn(document)) {
			expect(ref).toMatch(/^#\/components\/schemas\/./);
			expect(targetOf(document, ref), ref).toBeDefined();
		}
	});
});
