import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import { count } from 'drizzle-orm';
import { demoPassword, demoPeople } from '../../domain/people/demo';
import { inTransaction, type Connection } from '../db/client';
import { setting, user, userRole } from '../db/schema';

/** Fills an empty database with the demo; one with people in it is left as it is. */
export async function fillDemo(db: Connection, now: Date): Promise<boolean> {
	const [people] = await db.select({ n: count() }).from(user);
	if ((people?.n ?? 0) > 0) return false;
	const passwordHash = await hash(demoPassword);
	await inTransaction(db, async (tx) => {
		const rows = demoPeople.map((person) => ({
			id: randomUUID(),
			name: person.name,
			email: person.email,
			passwordHash,
			createdAt: now,
			role: person.role
		}));
		await tx.insert(user).values(rows);
		await tx.insert(userRole).values(rows.map(({ id, role }) => ({ userId: id, role })));
		await tx
			.insert(setting)
			.values({
				key: 'publication',
				isDemo: true,
				value: { name: 'Northlight Hardware', zone: 'Europe/Oslo', tagline: 'Measured first, then printed.' }
			});
	});
	return true;
}
