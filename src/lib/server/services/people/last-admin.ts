import { refuse } from '../../../domain/shared/outcome';
import type { Db } from '../../db/client';
import * as people from '../../db/queries/people';

/**
 * Refuses when a person is the only admin who is here. Locks the admins until the transaction ends, so that two who
 * take each other's role at once cannot both succeed. Ask it first in a transaction, before any other row is locked.
 */
export async function refuseForLastAdmin(tx: Db, personId: string) {
	const admins = await people.lockAdmins(tx);
	if (admins.length !== 1 || admins[0] !== personId) return null;
	const message = 'This is the last admin. Make somebody else an admin first.';
	return refuse('invalid', `${message} Nothing was changed.`, { fields: { roles: [message] } });
}
