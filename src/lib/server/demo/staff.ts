import { randomUUID } from 'node:crypto';
import { demoPassword, demoPeople } from '../../domain/people/demo';
import type { Actor, Role } from '../../domain/people/roles';
import { hashPassword } from '../auth/password';
import { isDuplicate, type Db } from '../db/client';
import * as audit from '../db/queries/audit';
import { user, userRole } from '../db/schema';

interface Member {
	name: string;
	email: string;
	role: Role;
}

const colleagues = [
	{ role: 'tester', name: 'Pelle Brandvik', email: 'pelle@northlight.example' },
	{ role: 'writer', name: 'Noor Haldane', email: 'noor@northlight.example' }
] as const satisfies readonly Member[];

const members = [...demoPeople, ...colleagues];

/** How the demo's acts call a person: the first name. */
export type Who = 'Tomas' | 'Ines' | 'Marit' | 'Jonas' | 'Adaeze' | 'Pelle' | 'Noor';

export type Staff = Record<Who, Actor>;

/**
 * Inserts the people of the demo, all invented. Null where they are there already: their addresses are unique, so
 * two fills at once meet here and the later one waits for the earlier.
 */
export async function insertStaff(db: Db, createdAt: Date): Promise<Staff | null> {
	const passwordHash = await hashPassword(demoPassword);
	const actors = members.map(({ name, email, role }): Actor => ({
		id: randomUUID(),
		name,
		email,
		roles: [role]
	}));
	const rows = actors.map(({ id, name, email }) => ({
		id,
		name,
		email,
		passwordHash,
		emailVerified: createdAt,
		createdAt
	}));
	try {
		await db.insert(user).values(rows);
	} catch (error) {
		if (isDuplicate(error)) return null;
		throw error;
	}
	await db
		.insert(userRole)
		.values(actors.flatMap(({ id, roles }) => roles.map((role) => ({ userId: id, role }))));
	await audit.append(
		db,
		actors.map(({ id, name, email, roles }) => ({
			at: createdAt,
			actorId: null,
			act: 'person.demo',
			subjectKind: 'person',
			subjectId: id,
			after: { name, email, roles }
		}))
	);
	return Object.fromEntries(actors.map((actor) => [actor.name.split(' ')[0], actor])) as Staff;
}
