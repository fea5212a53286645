import type { Actor } from '../../src/lib/domain/people/roles';
import type { Context } from '../../src/lib/server/context';
import type { Db } from '../../src/lib/server/db/client';

/** A service's context with a clock that stands still. */
export const contextFor = (db: Db, actor: Actor, now = new Date('2026-11-11T08:00:00.000Z')): Context => ({
	db,
	actor,
	now,
	origin: 'https://northlight.example'
});
