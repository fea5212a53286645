import type { Cookies, RequestEvent } from '@sveltejs/kit';
import type { Actor } from '../../src/lib/domain/people/roles';
import { origin } from './app';

export interface Asked {
	method?: string;
	path: string;
	headers?: Record<string, string>;
	/** Sent as a form. */
	form?: Record<string, string> | URLSearchParams;
	/** Sent as JSON. */
	json?: unknown;
	/** Sent as it stands. */
	body?: string;
	params?: Record<string, string>;
	actor?: Actor | null;
	/** What the browser holds; changed by the handler as a browser would change it. */
	cookies?: Map<string, string>;
	address?: string;
}

function jar(held: Map<string, string>): Cookies {
	return {
		get: (name) => held.get(name),
		getAll: () => [...held].map(([name, value]) => ({ name, value })),
		set: (name, value) => void held.set(name, value),
		delete: (name) => void held.delete(name),
		serialize: (name, value) => `${name}=${value}`
	};
}

function bodyOf({ form, json, body }: Asked): { body?: string; type?: string } {
	if (form) return { body: new URLSearchParams(form).toString(), type: 'application/x-www-form-urlencoded' };
	if (json !== undefined) return { body: JSON.stringify(json), type: 'application/json' };
	return body === undefined ? {} : { body, type: 'application/json' };
}

/** The event that the framework would hand to a hook or a handler; what it answers with in headers stands in `sent`. */
export function fakeEvent(asked: Asked): RequestEvent & { sent: Record<string, string> } {
	const url = new URL(asked.path, origin);
	const held = asked.cookies ?? new Map<string, string>();
	const { body, type } = bodyOf(asked);
	const headers = new Headers({ ...(type ? { 'content-type': type } : {}), ...asked.headers });
	if (held.size > 0) headers.set('cookie', [...held].map(([name, value]) => `${name}=${value}`).join('; '));
	const sent: Record<string, string> = {};
	const event = {
		url,
		params: asked.params ?? {},
		request: new Request(url, {
			method: asked.method ?? (body === undefined ? 'GET' : 'POST'),
			headers,
			body
		}),
		cookies: jar(held),
		locals: { actor: asked.actor ?? null, requestId: 'test' },
		getClientAddress: () => asked.address ?? '192.0.2.7',
		setHeaders: (more: Record<string, string>) => void Object.assign(sent, more),
		route: { id: null },
		isDataRequest: false,
		isSubRequest: false,
		sent
	};
	return event as unknown as RequestEvent & { sent: Record<string, string> };
}
