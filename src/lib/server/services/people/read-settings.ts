import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';

/** The settings as an admin sees them, with the version to save over. */
export async function readSettings(ctx: Context): Promise<Outcome<settings.Publication, 'forbidden'>> {
	if (!may(ctx.actor, 'settings.manage')) return refuse('forbidden', 'Only an admin sees the settings.');
	return done(await settings.publication(ctx.db));
}
