import { error, redirect, type RequestEvent, type ServerLoadEvent } from '@sveltejs/kit';
import { may, type Act } from '../../domain/people/policy';
import type { Actor } from '../../domain/people/roles';
import type { Outcome } from '../../domain/shared/outcome';
import { database } from '../app';
import { clock } from '../clock';
import type { Context, OpenContext } from '../context';
import { env } from '../env';
import { notSignedIn, problem, statusOf } from './problem';

/** The act a handler needs, or that it is open to all; read by the test that walks every route. */
export type Need = Act | 'public';

export interface Guarded {
	need: Need;
}

const mark = <F extends object>(need: Need, handler: F): F & Guarded => Object.assign(handler, { need });

const openContext = (event: RequestEvent | ServerLoadEvent): OpenContext => ({
	db: database().db,
	actor: event.locals.actor,
	now: clock.now(),
	origin: env().ORIGIN.replace(/\/$/, '')
});

function signedIn(event: RequestEvent | ServerLoadEvent, need: Act): Context {
	const context = openContext(event);
	if (!context.actor) {
		const back = event.url.pathname + event.url.search;
		redirect(303, `/sign-in?to=${encodeURIComponent(back)}`);
	}
	// Ownership is decided by the service, which knows the row; here the act must be possible for somebody like this.
	if (!couldEver(context.actor, need)) error(403, 'Your roles do not include this.');
	return context as Context;
}

/** Whether any subject exists for which the actor might do this act, as the author of it perhaps. */
const couldEver = (actor: Actor, need: Act) => may(actor, need) || may(actor, need, { authorId: actor.id });

/** A page's load for signed-in people: sends the visitor to sign in, refuses the wrong role. */
export const guarded = <E extends ServerLoadEvent | RequestEvent, R>(
	need: Act,
	handler: (event: E, context: Context) => R
) => mark(need, (event: E): R => handler(event, signedIn(event, need)));

/** A load, action or endpoint open to everyone. */
export const open = <E extends ServerLoadEvent | RequestEvent, R>(
	handler: (event: E, context: OpenContext) => R
) => mark('public', (event: E): R => handler(event, openContext(event)));

/** An API handler: answers problem+json where a page would redirect. */
export const guardedApi = <E extends RequestEvent>(
	need: Act,
	handler: (event: E, context: Context) => Promise<Response>
) =>
	mark(need, async (event: E): Promise<Response> => {
		const context = openContext(event);
		if (!context.actor) return notSignedIn();
		if (!couldEver(context.actor, need))
			return problem(403, 'Not allowed', 'Your roles, or the scopes of this token, do not include this.');
		return handler(event, context as Context);
	});

/** The value of an outcome in a load; a refusal becomes the error page with its words. */
export function valueOrError<T>(outcome: Outcome<T>): T {
	if (outcome.ok) return outcome.value;
	error(statusOf(outcome.reason), outcome.message);
}
