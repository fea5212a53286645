import { randomUUID } from 'node:crypto';
import { roles, type Actor, type Role } from '../../src/lib/domain/people/roles';
import type { Db } from '../../src/lib/server/db/client';
import { user, userRole } from '../../src/lib/server/db/schema';

const names: Record<Role, string> = {
	tester: 'Tomas Reyl',
	writer: 'Ines Calloway',
	editor: 'Marit Solberg',
	liaison: 'Jonas Vedeler',
	admin: 'Adaeze Okoro'
};

/** Inserts somebody with the given roles. */
export async function person(db: Db, name: string, email: string, held: Role[]): Promise<Actor> {
	const id = randomUUID();
	await db.insert(user).values({ id, name, email, createdAt: new Date('2026-01-05T09:00:00Z') });
	if (held.length > 0) await db.insert(userRole).values(held.map((role) => ({ userId: id, role })));
	return { id, name, email, roles: held };
}

/** One person for each role, one after the other: inserts side by side into an emptied table may deadlock. */
export async function people(db: Db): Promise<Record<Role, Actor>> {
	const made: [Role, Actor][] = [];
	for (const role of roles)
		made.push([role, await person(db, names[role], `${role}@northlight.example`, [role])]);
	return Object.fromEntries(made) as Record<Role, Actor>;
}
