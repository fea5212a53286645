import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PublicationInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as settings from '../../db/queries/settings';

/** Saves the publication's name, time zone and tagline. Times already stored stay: they are UTC. */
export async function savePublication(
	ctx: Context,
	{ name, zone, tagline, version }: PublicationInput
): Promise<Outcome<null, 'forbidden' | 'conflict'>> {
	if (!may(ctx.actor, 'settings.manage')) return refuse('forbidden', 'Only an admin changes the settings.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await settings.publication(tx);
		if (!(await settings.savePublication(tx, { name, zone, tagline }, version))) {
			return refuse(
				'conflict',
				'Somebody else changed the settings meanwhile. What you typed is kept; load the page to see theirs.'
			);
		}
		const old = { name: before.name, zone: before.zone, tagline: before.tagline };
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'setting.publication',
				subjectKind: 'setting',
				subjectId: 'publication',
				before: old,
				after: { name, zone, tagline }
			}
		]);
		return done(null);
	});
}
