import {
	and,
	asc,
	count,
	eq,
	exists,
	inArray,
	isNotNull,
	isNull,
	like,
	or,
	sql,
	type SQL
} from 'drizzle-orm';
import type { Role } from '../../../domain/people/roles';
import type { Db } from '../client';
import { user, userRole } from '../schema';

/** What sign-in needs to know of an address; null when nobody has it. */
export async function signInFacts(db: Db, email: string) {
	const [row] = await db
		.select({
			id: user.id,
			name: user.name,
			email: user.email,
			passwordHash: user.passwordHash,
			leftAt: user.leftAt,
			roles: count(userRole.role)
		})
		.from(user)
		.leftJoin(userRole, eq(userRole.userId, user.id))
		.where(eq(user.email, email))
		.groupBy(user.id);
	return row ? { ...row, mayEnter: row.leftAt === null && row.roles > 0 } : null;
}

export interface PeopleFilter {
	/** Part of a name or an address. */
	text?: string;
	role?: Role;
	state: 'here' | 'left' | 'all';
}

function matching(db: Db, { text, role, state }: PeopleFilter): SQL | undefined {
	const part = text ? `%${text.replace(/[\\%_]/g, '\\$&')}%` : undefined;
	return and(
		part ? or(like(user.name, part), like(user.email, part)) : undefined,
		state === 'here' ? isNull(user.leftAt) : state === 'left' ? isNotNull(user.leftAt) : undefined,
		role
			? exists(
					db
						.select({ one: sql`1` })
						.from(userRole)
						.where(and(eq(userRole.userId, user.id), eq(userRole.role, role)))
				)
			: undefined
	);
}

/** One page of people by name, with all who match counted. */
export async function list(db: Db, filter: PeopleFilter, page: { limit: number; offset: number }) {
	const where = matching(db, filter);
	const [rows, [total]] = await Promise.all([
		db
			.select({
				id: user.id,
				name: user.name,
				email: user.email,
				leftAt: user.leftAt,
				createdAt: user.createdAt
			})
			.from(user)
			.where(where)
			.orderBy(asc(user.name), asc(user.id))
			.limit(page.limit)
			.offset(page.offset),
		db.select({ n: count() }).from(user).where(where)
	]);
	return { rows, total: total?.n ?? 0 };
}

/** The roles of several people, a row each. */
export const rolesOf = async (db: Db, userIds: string[]) =>
	userIds.length === 0
		? []
		: db
				.select({ userId: userRole.userId, role: userRole.role })
				.from(userRole)
				.where(inArray(userRole.userId, userIds))
				.orderBy(asc(userRole.role));

/** One person, without their password's hash. */
export async function byId(db: Db, id: string) {
	const [row] = await db
		.select({
			id: user.id,
			name: user.name,
			email: user.email,
			leftAt: user.leftAt,
			createdAt: user.createdAt,
			version: user.version
		})
		.from(user)
		.where(eq(user.id, id));
	return row ?? null;
}

/** The stored hash of a person's password. */
export async function passwordHashOf(db: Db, id: string): Promise<string | null> {
	const [row] = await db.select({ hash: user.passwordHash }).from(user).where(eq(user.id, id));
	return row?.hash ?? null;
}

export interface NewPerson {
	id: string;
	name: string;
	email: string;
	passwordHash: string | null;
	emailVerified: Date | null;
	createdAt: Date;
}

/** Adds a person with their roles. */
export async function insert(db: Db, person: NewPerson, roles: readonly Role[]): Promise<void> {
	await db.insert(user).values(person);
	await addRoles(db, person.id, roles);
}

/** Gives roles; those already there stay. */
export async function addRoles(db: Db, userId: string, roles: readonly Role[]): Promise<void> {
	if (roles.length === 0) return;
	await db
		.insert(userRole)
		.ignore()
		.values(roles.map((role) => ({ userId, role })));
}

/** Takes roles away. */
export async function removeRoles(db: Db, userId: string, roles: readonly Role[]): Promise<void> {
	if (roles.length === 0) return;
	await db.delete(userRole).where(and(eq(userRole.userId, userId), inArray(userRole.role, [...roles])));
}

/** Locks the admins who are here until the transaction ends, so that two changes at once cannot leave none. */
export async function lockAdmins(tx: Db): Promise<string[]> {
	const rows = await tx
		.select({ id: userRole.userId })
		.from(userRole)
		.innerJoin(user, eq(user.id, userRole.userId))
		.where(and(eq(userRole.role, 'admin'), isNull(user.leftAt)))
		.for('update');
	return rows.map((row) => row.id);
}

/** Changes a person over the version that was seen; says whether they were. */
export async function update(
	db: Db,
	id: string,
	seen: number,
	change: { name?: string; leftAt?: Date | null }
): Promise<boolean> {
	const [changed] = await db
		.update(user)
		.set({ ...change, version: sql`${user.version} + 1` })
		.where(and(eq(user.id, id), eq(user.version, seen)));
	return changed.affectedRows === 1;
}

/** Sets a password's hash. */
export const setPassword = (db: Db, id: string, passwordHash: string) =>
	db.update(user).set({ passwordHash }).where(eq(user.id, id));

/** Lets a person in again, whatever version they are at. */
export const reinstate = (db: Db, id: string) =>
	db
		.update(user)
		.set({ leftAt: null, version: sql`${user.version} + 1` })
		.where(eq(user.id, id));
