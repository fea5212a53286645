import type { Actor } from '../domain/people/roles';
import type { Db } from './db/client';

/** What every service is given: where the data is, who acts, what time it is, and how people reach us. */
export interface Context<A extends Actor | null = Actor> {
	db: Db;
	actor: A;
	now: Date;
	/** Base address for links in mails and feeds, without a slash at its end. */
	origin: string;
}

/** A service that anyone may call, such as the readers' pages and sign-in. */
export type OpenContext = Context<Actor | null>;
/** The application itself acts: the schedule, the outbox, the demo. */
export type SystemContext = Omit<Context, 'actor'>;
