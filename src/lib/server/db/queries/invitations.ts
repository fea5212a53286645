import { and, desc, eq, isNull } from 'drizzle-orm';
import type { Role } from '../../../domain/people/roles';
import type { Db } from '../client';
import { invitation, user } from '../schema';

export interface NewInvitation {
	email: string;
	name: string;
	roles: Role[];
	tokenHash: string;
	invitedBy: string;
	createdAt: Date;
	expiresAt: Date;
}

const waiting = and(isNull(invitation.acceptedAt), isNull(invitation.revokedAt));

/** Invitations neither accepted nor revoked, newest first, those that have run out among them. */
export const listWaiting = (db: Db) =>
	db
		.select({
			id: invitation.id,
			email: invitation.email,
			name: invitation.name,
			roles: invitation.roles,
			createdAt: invitation.createdAt,
			expiresAt: invitation.expiresAt,
			invitedBy: user.name
		})
		.from(invitation)
		.innerJoin(user, eq(user.id, invitation.invitedBy))
		.where(waiting)
		.orderBy(desc(invitation.id))
		.limit(200);

/** The waiting invitation to an address, if there is one. */
export async function waitingFor(db: Db, email: string) {
	const [row] = await db
		.select({ id: invitation.id, expiresAt: invitation.expiresAt })
		.from(invitation)
		.where(and(eq(invitation.email, email), waiting));
	return row ?? null;
}

/** The waiting invitation with this number, locked until the transaction ends. */
export async function lockWaiting(tx: Db, id: number) {
	const [row] = await tx
		.select()
		.from(invitation)
		.where(and(eq(invitation.id, id), waiting))
		.for('update');
	return row ?? null;
}

/** The invitation a link stands for, whatever became of it. */
export async function byHash(db: Db, tokenHash: string) {
	const [row] = await db.select().from(invitation).where(eq(invitation.tokenHash, tokenHash));
	return row ?? null;
}

/** Adds an invitation and returns its number. */
export async function insert(db: Db, row: NewInvitation): Promise<number> {
	const [made] = await db.insert(invitation).values(row).$returningId();
	if (!made) throw new Error('The invitation was not stored.');
	return made.id;
}

/** Changes what became of an invitation, or its link. */
export const update = (
	db: Db,
	id: number,
	change: { tokenHash?: string; expiresAt?: Date; acceptedAt?: Date; revokedAt?: Date }
) => db.update(invitation).set(change).where(eq(invitation.id, id));
