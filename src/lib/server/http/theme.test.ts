import type { Cookies, RequestEvent } from '@sveltejs/kit';
import { describe, expect, it } from 'vitest';
import { keepTheme, theme } from './theme';

const shell = '<html lang="en" data-theme="%theme%">';

/** The page's first chunk as it leaves for somebody whose browser sends this cookie. */
async function pageFor(cookie: string | undefined): Promise<string> {
	let html = '';
	await theme({
		event: { cookies: { get: () => cookie } } as unknown as RequestEvent,
		resolve: async (_event, options) => {
			html = (await options?.transformPageChunk?.({ html: shell, done: true })) ?? '';
			return new Response();
		}
	});
	return html;
}

describe('the chosen look', () => {
	it('is in the page before it leaves', async () => {
		expect(await pageFor('dark')).toBe('<html lang="en" data-theme="dark">');
	});
	it('is the system’s where none was chosen, and where the cookie says anything else', async () => {
		expect(await pageFor(undefined)).toBe('<html lang="en" >');
		expect(await pageFor('"><script>alert(1)</script>')).toBe('<html lang="en" >');
	});
	it('keeps a choice, forgets the system’s', () => {
		const calls: string[] = [];
		const cookies = {
			set: (name: string, value: string) => calls.push(`set ${name} ${value}`),
			delete: (name: string) => calls.push(`delete ${name}`)
		} as unknown as Cookies;
		for (const chosen of ['light', 'system', 'puce', null]) keepTheme(cookies, chosen);
		expect(calls).toEqual(['set theme light', 'delete theme', 'delete theme', 'delete theme']);
	});
});
