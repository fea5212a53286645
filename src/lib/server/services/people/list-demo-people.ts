import { done, type Outcome } from '../../../domain/shared/outcome';
import type { OpenContext } from '../../context';
import * as people from '../../db/queries/people';
import * as settings from '../../db/queries/settings';

export interface DemoPerson {
	name: string;
	email: string;
	roles: string[];
}

/** In the demo, and only there, who can be tried out from the sign-in page; null in a real publication. */
export async function listDemoPeople(ctx: OpenContext): Promise<Outcome<DemoPerson[] | null, never>> {
	const { isDemo } = await settings.publication(ctx.db);
	if (!isDemo) return done(null);
	const { rows } = await people.list(ctx.db, { state: 'here' }, { limit: 12, offset: 0 });
	const held = await people.rolesOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	const shown = rows
		.filter(({ email }) => email.endsWith('.example'))
		.map(({ id, name, email }) => ({
			name,
			email,
			roles: held.filter((row) => row.userId === id).map((row) => row.role)
		}));
	return done(shown);
}
