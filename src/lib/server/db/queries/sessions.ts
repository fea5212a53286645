import { and, count, eq, gt, isNull, lt, ne } from 'drizzle-orm';
import type { Db } from '../client';
import { session, user, userRole, verificationToken } from '../schema';

/** The person behind a session with their roles, a row per role; none for an expired session, a person who has left or has no role. */
export const actorRows = (db: Db, sessionToken: string, now: Date) =>
	db
		.select({
			id: user.id,
			name: user.name,
			email: user.email,
			role: userRole.role,
			expires: session.expires
		})
		.from(session)
		.innerJoin(user, eq(user.id, session.userId))
		.innerJoin(userRole, eq(userRole.userId, user.id))
		.where(and(eq(session.sessionToken, sessionToken), gt(session.expires, now), isNull(user.leftAt)));

/** Moves a session's end. */
export const prolong = (db: Db, sessionToken: string, expires: Date) =>
	db.update(session).set({ expires }).where(eq(session.sessionToken, sessionToken));

/** How many browsers a person is signed in with. */
export async function countOf(db: Db, userId: string, now: Date): Promise<number> {
	const [row] = await db
		.select({ n: count() })
		.from(session)
		.where(and(eq(session.userId, userId), gt(session.expires, now)));
	return row?.n ?? 0;
}

/** Ends all sessions of a person, but the one to keep if it is named. */
export const endAll = (db: Db, userId: string, keepToken?: string) =>
	db
		.delete(session)
		.where(and(eq(session.userId, userId), keepToken ? ne(session.sessionToken, keepToken) : undefined));

/** Stores the hash of an e-mailed link. */
export const addVerificationToken = (db: Db, row: { identifier: string; token: string; expires: Date }) =>
	db.insert(verificationToken).values(row);

/** Reads a link without using it. */
export async function readVerificationToken(db: Db, identifier: string, token: string) {
	const [row] = await db
		.select()
		.from(verificationToken)
		.where(and(eq(verificationToken.identifier, identifier), eq(verificationToken.token, token)));
	return row ?? null;
}

/** Takes a link's row away and returns it; null when it was never there or somebody took it first. Needs a transaction. */
export async function takeVerificationToken(tx: Db, identifier: string, token: string) {
	const same = and(eq(verificationToken.identifier, identifier), eq(verificationToken.token, token));
	const [row] = await tx.select().from(verificationToken).where(same).for('update');
	if (!row) return null;
	await tx.delete(verificationToken).where(same);
	return row;
}

/** Makes every open link of one kind and person useless. */
export const dropVerificationTokens = (db: Db, identifier: string) =>
	db.delete(verificationToken).where(eq(verificationToken.identifier, identifier));

/** Clears away what has run out. */
export async function sweep(db: Db, before: Date): Promise<void> {
	await db.delete(session).where(lt(session.expires, before));
	await db.delete(verificationToken).where(lt(verificationToken.expires, before));
}
