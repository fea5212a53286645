import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { fakeEvent } from '../../../../tests/support/event';
import { answer, readJson, readQuery } from './api';
import { apiProblems } from './api-problems';
import { jsonLimitBytes } from './body';
import { page, pageQuery } from './paging';

const schema = z.object({
	name: z.string().min(1, 'Write a name.'),
	readings: z.array(z.number('Not a number.'))
});
const read = (body: string, headers: Record<string, string> = {}) =>
	readJson(fakeEvent({ path: '/api/v1/x', body, headers }), schema);

async function problemOf(body: string, headers?: Record<string, string>) {
	const result = await read(body, headers);
	if (result.ok) throw new Error('was accepted');
	expect(result.response.headers.get('content-type')).toBe('application/problem+json');
	const document = (await result.response.json()) as Record<string, unknown>;
	// RFC 9457, section 3.1: the members, and that `status` repeats the response's own.
	expect(document).toMatchObject({ type: 'about:blank', status: result.response.status });
	return document;
}

describe('a JSON body', () => {
	it('goes through its schema', async () => {
		const result = await read('{"name":"a","readings":[1.5]}');
		expect(result).toEqual({ ok: true, value: { name: 'a', readings: [1.5] } });
	});

	it('that is refused says why by field path', async () => {
		const document = await problemOf('{"name":"","readings":[1,"2 ms"]}');
		expect(document).toMatchObject({
			status: 422,
			errors: { name: ['Write a name.'], 'readings.1': ['Not a number.'] }
		});
	});

	it('that is no JSON says where it stops, and that NaN is none', async () => {
		expect(await problemOf('{"name":')).toMatchObject({ status: 400 });
		const document = await problemOf('{"name":"a","readings":[NaN]}');
		expect(document.detail).toMatch(/JSON knows no NaN/);
	});

	it('with a number beyond a double is refused, not read as infinity', async () => {
		expect(await problemOf('{"name":"a","readings":[1e400]}')).toMatchObject({ status: 422 });
	});

	it('larger than the limit is refused, whether it says its size or not', async () => {
		const long = `{"name":"${'x'.repeat(jsonLimitBytes)}"}`;
		expect(await problemOf(long)).toMatchObject({ status: 413 });
		expect(await problemOf('{}', { 'content-length': String(jsonLimitBytes + 1) })).toMatchObject({
			status: 413
		});
	});

	it('must say that it is JSON: a form of another site cannot pass for one', async () => {
		for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'application/jsonx', ''])
			expect(await problemOf('{}', { 'content-type': type }), type).toMatchObject({ status: 415 });
		const withCharset = await read('{"name":"a","readings":[]}', {
			'content-type': 'application/json; charset=utf-8'
		});
		expect(withCharset.ok).toBe(true);
	});

	it('must be an object of the shape, whatever JSON it is', async () => {
		for (const body of ['null', '[]', '"x"', '12']) {
			expect(await problemOf(body), body).toMatchObject({
				status: 422,
				errors: { body: [expect.any(String)] }
			});
		}
	});

	it('in bytes that are no UTF-8 is refused', async () => {
		const event = fakeEvent({ path: '/api/v1/x' });
		const headers = { 'content-type': 'application/json' };
		const request = new Request(event.url, {
			method: 'POST',
			headers,
			body: new Uint8Array([0x22, 0xff, 0x22])
		});
		const result = await readJson({ request }, schema);
		expect(result).toMatchObject({ ok: false, response: { status: 422 } });
	});
});

describe('a page of a list', () => {
	const url = new URL('https://northlight.example/api/v1/things?limit=2&kind=x');
	const query = { limit: 2 };

	it('names the next in its body and in Link (RFC 8288)', async () => {
		const response = page(url, ['a', 'b', 'c'], query, (item) => item);
		expect(await response.json()).toEqual({ items: ['a', 'b'], next: 'b' });
		expect(response.headers.get('link')).toBe('</api/v1/things?limit=2&kind=x&after=b>; rel="next"');
	});

	it('that is the last names none', async () => {
		const response = page(url, ['a', 'b'], query, (item) => item);
		expect(await response.json()).toEqual({ items: ['a', 'b'], next: null });
		expect(response.headers.has('link')).toBe(false);
	});

	it('has 1 to 200 items, 50 where nothing is asked', () => {
		const limitOf = (text: string) => readQuery(new URL(`https://x.example/?${text}`), pageQuery);
		expect(limitOf('')).toMatchObject({ ok: true, value: { limit: 50 } });
		for (const wrong of ['limit=0', 'limit=201', 'limit=x', 'limit=1.5', 'limit=1e400'])
			expect(limitOf(wrong), wrong).toMatchObject({ ok: false, response: { status: 422 } });
	});
});

describe('errors under /api', () => {
	const through = (path: string, response: Response) =>
		apiProblems({ event: fakeEvent({ path }), resolve: () => response });

	it('become problem documents whoever answered, and keep their headers', async () => {
		const plain = new Response('PATCH method not allowed', {
			status: 405,
			headers: { 'content-type': 'text/plain;charset=UTF-8', allow: 'GET, POST' }
		});
		const response = await through('/api/v1/things', plain);
		expect(response.headers.get('allow')).toBe('GET, POST');
		expect(await response.json()).toMatchObject({ status: 405, title: 'Method not allowed' });
	});

	it('tell nothing of what failed inside', async () => {
		const inner = new Response('{"message":"secret table"}', {
			status: 500,
			headers: { 'content-type': 'application/json' }
		});
		const text = await (await through('/api/v1/things', inner)).text();
		expect(text).not.toContain('secret table');
	});

	it('leave pages and good answers as they are', async () => {
		const page404 = new Response('x', { status: 404 });
		expect(await through('/desk', page404)).toBe(page404);
		const good = answer({ ok: true, value: 1 });
		expect(await through('/api/v1/things', good)).toBe(good);
	});
});
