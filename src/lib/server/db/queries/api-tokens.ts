import { and, desc, eq, gt, isNull, lt, or } from 'drizzle-orm';
import type { Scope } from '../../../domain/people/roles';
import type { Db } from '../client';
import { apiToken, user, userRole } from '../schema';

/** The person behind a token with their roles, a row per role; none for a token that is revoked or has run out. */
export const actorRows = (db: Db, tokenHash: string, now: Date) =>
	db
		.select({
			id: user.id,
			name: user.name,
			email: user.email,
			role: userRole.role,
			tokenId: apiToken.id,
			scopes: apiToken.scopes,
			lastUsedAt: apiToken.lastUsedAt
		})
		.from(apiToken)
		.innerJoin(user, eq(user.id, apiToken.userId))
		.innerJoin(userRole, eq(userRole.userId, user.id))
		.where(
			and(
				eq(apiToken.tokenHash, tokenHash),
				isNull(apiToken.revokedAt),
				or(isNull(apiToken.expiresAt), gt(apiToken.expiresAt, now)),
				isNull(user.leftAt)
			)
		);

/** Notes a use, unless another request noted one after `unlessAfter`. */
export const markUsed = (db: Db, id: number, now: Date, unlessAfter: Date) =>
	db
		.update(apiToken)
		.set({ lastUsedAt: now })
		.where(and(eq(apiToken.id, id), or(isNull(apiToken.lastUsedAt), lt(apiToken.lastUsedAt, unlessAfter))));

/** A person's tokens that were not revoked, newest first; never their hashes. */
export const ofUser = (db: Db, userId: string) =>
	db
		.select({
			id: apiToken.id,
			name: apiToken.name,
			scopes: apiToken.scopes,
			createdAt: apiToken.createdAt,
			lastUsedAt: apiToken.lastUsedAt,
			expiresAt: apiToken.expiresAt
		})
		.from(apiToken)
		.where(and(eq(apiToken.userId, userId), isNull(apiToken.revokedAt)))
		.orderBy(desc(apiToken.id));

export interface NewToken {
	userId: string;
	name: string;
	tokenHash: string;
	scopes: Scope[];
	createdAt: Date;
	expiresAt: Date | null;
}

/** Stores a token by its hash and returns its number. */
export async function insert(db: Db, row: NewToken): Promise<number> {
	const [made] = await db.insert(apiToken).values(row).$returningId();
	if (!made) throw new Error('The token was not stored.');
	return made.id;
}

/** Ends one token of a person; says whether there was one to end. */
export async function revoke(db: Db, userId: string, id: number, now: Date): Promise<boolean> {
	const [changed] = await db
		.update(apiToken)
		.set({ revokedAt: now })
		.where(and(eq(apiToken.id, id), eq(apiToken.userId, userId), isNull(apiToken.revokedAt)));
	return changed.affectedRows === 1;
}

/** Ends every token of a person. */
export const revokeAll = (db: Db, userId: string, now: Date) =>
	db
		.update(apiToken)
		.set({ revokedAt: now })
		.where(and(eq(apiToken.userId, userId), isNull(apiToken.revokedAt)));
