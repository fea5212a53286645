import type { RequestEvent } from '@sveltejs/kit';
import { describe, expect, it } from 'vitest';
import { bodyLimit } from './body-limit';

const form = 'application/x-www-form-urlencoded';

/** What is answered to a body of a stated length on a route; 200 where it is let through. */
async function answered(route: string, headers: Record<string, string>, body: string | null = 'a=b') {
	const request = new Request('https://northlight.example/', { method: 'POST', headers, body });
	const event = { request, route: { id: route } } as unknown as RequestEvent;
	return (await bodyLimit({ event, resolve: () => Promise.resolve(new Response()) } as never)).status;
}

describe('a body', () => {
	it.each([
		['/(staff)/stores', '1000', 200],
		['/(staff)/stores', '2100000', 413],
		['/(staff)/desk/new/import', '2100000', 200],
		['/(staff)/desk/new/import', '61000000', 413],
		['/api/v1/pictures', '24000000', 200],
		['/api/v1/pictures', '26000000', 413]
	])('for %s of %s bytes is answered %d', async (route, length, status) => {
		expect(await answered(route, { 'content-type': form, 'content-length': length })).toBe(status);
	});

	it('of a form must state its length: it would be read whole before anybody counted', async () => {
		expect(await answered('/(staff)/stores', { 'content-type': form })).toBe(411);
		expect(await answered('/(staff)/stores', { 'content-type': 'multipart/form-data; boundary=x' })).toBe(
			411
		);
		// JSON is counted as it is read.
		expect(await answered('/(staff)/stores', { 'content-type': 'application/json' })).toBe(200);
	});

	it('that is not there is let through', async () => {
		expect(await answered('/(staff)/stores', {}, null)).toBe(200);
	});
});
