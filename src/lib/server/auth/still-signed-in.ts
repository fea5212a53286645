import type { RequestEvent } from '@sveltejs/kit';
import { may, type Act } from '../../domain/people/policy';
import { database } from '../app';
import { clock } from '../clock';
import * as sessions from '../db/queries/sessions';
import { sessionCookie } from './session-cookie';

/** Whether the session of a request that is still being answered stands, with a role that may do this. */
export async function stillMay(event: RequestEvent, act: Act): Promise<boolean> {
	const token = event.cookies.get(sessionCookie());
	if (!token) return false;
	const rows = await sessions.actorRows(database().db, token, clock.now());
	const [first] = rows;
	if (!first) return false;
	const { id, name, email } = first;
	return may({ id, name, email, roles: rows.map((row) => row.role) }, act);
}
